const ascii = (text: string) => [...text].map((letter) => letter.charCodeAt(0));
const segment = (marker: number, content: number[]) => {
  const length = content.length + 2;
  return [0xff, marker, length >> 8, length & 0xff, ...content];
};

/** What a camera writes beside the picture, with words that must never come out again. */
export const SECRETS = ['GPS 41.2 N 70.1 W', 'preview', 'made by a phone'];

/** The bytes of a JPEG with everything that a camera adds; its scan is noise of a wanted length. */
export function jpegFile({ width = 640, height = 480, scanBytes = 300 } = {}): Uint8Array<ArrayBuffer> {
  const frame = [8, height >> 8, height & 0xff, width >> 8, width & 0xff, 1, 1, 0x11, 0];
  const scan = Array.from({ length: scanBytes }, (_, at) => (at * 37 + 11) % 255);
  return new Uint8Array([
    ...[0xff, 0xd8],
    ...segment(0xe0, [...ascii('JFIF\0'), 1, 2, 0, 0, 1, 0, 1, 0, 0]),
    ...segment(0xe1, ascii(`Exif\0\0${SECRETS[0]}`)),
    ...segment(0xe2, ascii(`MPF\0${SECRETS[1]}`)),
    ...segment(0xfe, ascii(SECRETS[2] ?? '')),
    ...segment(0xdb, [0, ...Array.from({ length: 64 }, () => 1)]),
    ...segment(0xc0, frame),
    ...segment(0xda, [1, 1, 0, 0, 63, 0]),
    ...scan,
    // A stuffed zero and a restart belong to the scan.
    ...[0xff, 0x00, 0xff, 0xd0, 7],
    ...[0xff, 0xd9],
    ...ascii(SECRETS[0] ?? ''),
  ]);
}
