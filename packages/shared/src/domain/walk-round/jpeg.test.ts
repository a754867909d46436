import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { kindOfFile, readJpeg } from './jpeg.ts';
import { SECRETS, jpegFile } from './testing/jpeg-file.ts';

const bytesOf = (text: string) => Uint8Array.from([...text].map((letter) => letter.charCodeAt(0)));
const textOf = (bytes: Uint8Array) => String.fromCharCode(...bytes);

describe('what a file is', () => {
  test.each([
    ['a PDF, whatever its name', bytesOf('%PDF-1.7'), 'pdf'],
    ['a HEIC', bytesOf('\0\0\0\x18ftypheic'), 'heic'],
    ['a PNG', bytesOf('\x89PNG\r\n'), 'png'],
    ['a WebP', bytesOf('RIFF1234WEBP'), 'webp'],
    ['a JPEG', jpegFile(), 'jpeg'],
    ['nothing', new Uint8Array(), 'unknown'],
  ])('%s', (_what, bytes, kind) => {
    expect(kindOfFile(bytes)).toBe(kind);
  });
});

describe('a JPEG', () => {
  test('tells its size and loses all but the picture', () => {
    const picture = readJpeg(jpegFile({ width: 1600, height: 1067 }));
    expect(picture).toMatchObject({ width: 1600, height: 1067 });
    const text = textOf(picture?.bytes ?? new Uint8Array());
    for (const secret of SECRETS) expect(text).not.toContain(secret);
    expect(text).not.toContain('Exif');
    expect(text).toContain('JFIF');
  });
  test('once stripped stays the same', () => {
    const once = readJpeg(jpegFile())?.bytes ?? new Uint8Array();
    expect(readJpeg(once)?.bytes).toEqual(once);
  });
  test('keeps its whole scan', () => {
    const sizes = [300, 900].map((scanBytes) => readJpeg(jpegFile({ scanBytes }))?.bytes.length ?? 0);
    expect((sizes[1] ?? 0) - (sizes[0] ?? 0)).toBe(600);
  });
  test.each([
    ['cut off anywhere', jpegFile().subarray(0, 300)],
    ['without a picture', new Uint8Array([0xff, 0xd8, 0xff, 0xd9])],
    ['of no size', jpegFile({ width: 0 })],
    ['of a size no phone sends', jpegFile({ width: 20_000 })],
  ])('%s is none', (_what, bytes) => {
    expect(readJpeg(bytes)).toBeNull();
  });
  test('that is noise is refused, never thrown at', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (noise) => {
        const file = new Uint8Array([0xff, 0xd8, 0xff, ...noise]);
        const picture = readJpeg(file);
        return picture === null || picture.bytes.length <= file.length;
      }),
    );
  });
});
