export interface QrModules {
  /** Modules along a side: 21 and 4 more for each version (ISO/IEC 18004). */
  size: number;
  isDark: (x: number, y: number) => boolean;
}

/**
 * The pattern of a QR code for a text, with error correction M (about 15 % may be hidden by a scratch or glare).
 * The encoder is fetched with the first code.
 * @throws Error when the text is too long for a code
 */
export async function qrModules(value: string): Promise<QrModules> {
  const { create } = await import('qrcode');
  const { modules } = create(value, { errorCorrectionLevel: 'M' });
  return { size: modules.size, isDark: (x, y) => modules.get(y, x) === 1 };
}

/** Dark modules as one SVG path, each run in a row as a bar; a unit is a module. */
export function qrPath({ size, isDark }: QrModules): string {
  const bars: string[] = [];
  for (let y = 0; y < size; y++) {
    for (let x = 0; x < size; x++) {
      if (!isDark(x, y)) continue;
      const start = x;
      while (x + 1 < size && isDark(x + 1, y)) x++;
      const length = x + 1 - start;
      bars.push(`M${start} ${y}h${length}v1h-${length}z`);
    }
  }
  return bars.join('');
}
