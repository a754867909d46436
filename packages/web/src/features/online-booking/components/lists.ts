/** Typed with commas or on lines, as a list without empty parts. */
export function listOf(text: string): string[] {
  return text
    .split(/[,\n]/)
    .map((part) => part.trim())
    .filter((part) => part !== '');
}

/** "8:00, 14" as clock times of two digits: 08:00, 14:00; what is no time stays as it was typed, to be named. */
export function timesOf(text: string): string[] {
  return listOf(text).map((part) => {
    const found = /^(\d{1,2})(?::(\d{2}))?$/.exec(part);
    return found ? `${(found[1] ?? '').padStart(2, '0')}:${found[2] ?? '00'}` : part;
  });
}
