/**
 * Reads JPEG by its content. Markers and segments: ITU-T T.81 (1992), annex B; the names of application segments:
 * JFIF 1.02 (APP0), ICC.1:2010 annex B.4 (APP2), and APP14 "Adobe", which tells the colour transform.
 */
export interface JpegPicture {
  width: number;
  height: number;
  /** The picture alone: no EXIF, position, comment, embedded preview, nor anything after its end. */
  bytes: Uint8Array;
}

const SOI = 0xd8;
const EOI = 0xd9;
const SOS = 0xda;
const COM = 0xfe;
/** Baseline, extended and progressive frames; arithmetic and lossless ones no browser shows. */
const FRAMES = [0xc0, 0xc1, 0xc2];
const KEPT_SEGMENTS: Record<number, string> = { 0xe0: 'JFIF\0', 0xe2: 'ICC_PROFILE\0', 0xee: 'Adobe' };
/** Longest side that is taken, pixels. */
const LONGEST = 10_000;

export type FileKind = 'jpeg' | 'png' | 'webp' | 'heic' | 'pdf' | 'unknown';

/** What a file is by its first bytes, whatever its name says. */
export function kindOfFile(head: Uint8Array): FileKind {
  const text = (from: number, to: number) => String.fromCharCode(...head.subarray(from, to));
  if (head[0] === 0xff && head[1] === SOI && head[2] === 0xff) return 'jpeg';
  if (head[0] === 0x89 && text(1, 4) === 'PNG') return 'png';
  if (text(0, 4) === 'RIFF' && text(8, 12) === 'WEBP') return 'webp';
  if (text(4, 8) === 'ftyp' && /^(hei[cxms]|hev[cxm]|mif1|msf1)/.test(text(8, 12))) return 'heic';
  if (text(0, 5) === '%PDF-') return 'pdf';
  return 'unknown';
}

/** The picture without anything that is not needed to show it; null when it is no whole JPEG. */
export function readJpeg(file: Uint8Array): JpegPicture | null {
  if (kindOfFile(file) !== 'jpeg') return null;
  const kept: Uint8Array[] = [file.subarray(0, 2)];
  let size: { width: number; height: number } | null = null;
  let hasScan = false;
  let at = 2;
  while (at + 1 < file.length) {
    if (file[at] !== 0xff) return null;
    const marker = file[at + 1] ?? 0;
    if (marker === 0xff) {
      at += 1; // Fill bytes before a marker.
      continue;
    }
    if (marker === EOI) {
      if (!size || !hasScan) return null;
      return { ...size, bytes: joined([...kept, file.subarray(at, at + 2)]) };
    }
    const length = ((file[at + 2] ?? 0) << 8) | (file[at + 3] ?? 0);
    const end = at + 2 + length;
    if (length < 2 || end > file.length) return null;
    if (FRAMES.includes(marker)) size = sizeOf(file.subarray(at, end));
    if (FRAMES.includes(marker) && !size) return null;
    let next = end;
    if (marker === SOS) {
      hasScan = true;
      next = endOfScan(file, end);
    }
    if (isNeeded(marker, file.subarray(at + 4, end))) kept.push(file.subarray(at, next));
    at = next;
  }
  return null;
}

function sizeOf(frame: Uint8Array): { width: number; height: number } | null {
  const [height, width] = [5, 7].map((at) => ((frame[at] ?? 0) << 8) | (frame[at + 1] ?? 0));
  if (!width || !height || width > LONGEST || height > LONGEST) return null;
  return { width, height };
}

function isNeeded(marker: number, content: Uint8Array): boolean {
  const isApplication = marker >= 0xe0 && marker <= 0xef;
  if (!isApplication) return marker !== COM;
  const name = KEPT_SEGMENTS[marker];
  return name !== undefined && String.fromCharCode(...content.subarray(0, name.length)) === name;
}

/** In a scan a marker is 0xff with anything after it but a stuffed zero or a restart. */
function endOfScan(file: Uint8Array, from: number): number {
  for (let at = from; at + 1 < file.length; at += 1) {
    const next = file[at + 1] ?? 0;
    if (file[at] === 0xff && next !== 0 && !(next >= 0xd0 && next <= 0xd7) && next !== 0xff) return at;
  }
  return file.length;
}

function joined(parts: Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  parts.reduce((at, part) => {
    whole.set(part, at);
    return at + part.length;
  }, 0);
  return whole;
}
