/** The only words in braces that a template may hold. No gate code, no street, no phone but the company's is among them. */
export const placeholders = [
  'name',
  'company',
  'phone',
  'window',
  'day',
  'services',
  'crew',
  'van',
  'link',
  'amount',
  'estimate',
] as const;
export type Placeholder = (typeof placeholders)[number];
export type PlaceholderValues = Record<Placeholder, string>;

export const placeholderNames: Record<Placeholder, string> = {
  name: 'the customer’s first name, or a company’s whole name',
  company: 'your company’s name',
  phone: 'your company’s phone',
  window: 'the arrival window',
  day: 'the day of the visit',
  services: 'what was booked',
  crew: 'first names of the crew',
  van: 'the van’s name',
  link: 'the customer’s own page of the job',
  amount: 'the amount: to pay, paid or given back',
  estimate: 'when the crew is expected, about',
};

const IN_BRACES = /\{([^{}\n]*)\}/g;

/** Words in braces that are no placeholder, as they were written and each once. */
export function unknownPlaceholders(template: string): string[] {
  const found = [...template.matchAll(IN_BRACES)].map(([, word = '']) => word);
  return [...new Set(found)].filter((word) => !isPlaceholder(word));
}

/** A sentence for the field, or null when all is known. */
export function placeholderFault(template: string): string | null {
  const unknown = unknownPlaceholders(template);
  if (unknown.length === 0) return null;
  const said = unknown.map((word) => `{${word}}`).join(', ');
  const known = placeholders.map((word) => `{${word}}`).join(' ');
  return `${said} is not known here. Use ${known}, or take the braces away.`;
}

/** Each placeholder becomes its value, once: what a customer's name holds in braces is left as it is. */
export function fillPlaceholders(template: string, values: PlaceholderValues): string {
  return template.replace(IN_BRACES, (whole, word: string) => (isPlaceholder(word) ? values[word] : whole));
}

function isPlaceholder(word: string): word is Placeholder {
  return placeholders.includes(word as Placeholder);
}
