import type { FileKind } from '@driprail/shared/domain/walk-round/jpeg';
import { kindOfFile } from '@driprail/shared/domain/walk-round/jpeg';
import { PHOTO_LONGEST_SIDE } from '@driprail/shared/domain/walk-round/photo-limits';

/** Why a file did not become a photo, in words that say what to do. */
export class PhotoFault extends Error {}

export interface PreparedPhoto {
  blob: Blob;
  /** Hex; what arrives in pieces is checked against it. */
  sha256: string;
}

/**
 * Makes a photo of a picked or taken file: upright, at most 1,600 px long, drawn anew as JPEG, so that position, time and
 * camera stay behind.
 * @throws PhotoFault when the file is none, or none that this phone can read
 */
export async function preparePhoto(file: Blob): Promise<PreparedPhoto> {
  const kind = kindOfFile(new Uint8Array(await file.slice(0, 16).arrayBuffer()));
  if (kind === 'pdf')
    throw new PhotoFault('That file is a PDF, whatever its name says. Take the photo with the camera.');
  const picture = await decoded(file, kind);
  try {
    const blob = await drawn(picture);
    return { blob, sha256: await hashOf(blob) };
  } finally {
    picture.close();
  }
}

async function decoded(file: Blob, kind: FileKind): Promise<ImageBitmap> {
  try {
    return await createImageBitmap(file, { imageOrientation: 'from-image' });
  } catch {
    throw new PhotoFault(wordsOf(file, kind));
  }
}

function wordsOf(file: Blob, kind: FileKind): string {
  if (kind === 'heic')
    return 'This phone can’t open that HEIC picture. Take it with the camera here, or set the phone’s camera to JPEG (“most compatible”) and pick it again.';
  if (kind === 'unknown') return 'That file is no photo. Take it with the camera, or pick another.';
  const megabytes = Math.round(file.size / 1024 / 1024);
  if (megabytes >= 20)
    return `That photo of ${megabytes} MB is too large for this phone to open. Take it with the camera here.`;
  return 'That photo is damaged and can’t be opened. Take it anew.';
}

async function drawn(picture: ImageBitmap): Promise<Blob> {
  const scale = Math.min(1, PHOTO_LONGEST_SIDE / Math.max(picture.width, picture.height));
  const canvas = document.createElement('canvas');
  canvas.width = Math.max(1, Math.round(picture.width * scale));
  canvas.height = Math.max(1, Math.round(picture.height * scale));
  const pen = canvas.getContext('2d');
  if (!pen) throw new PhotoFault('This phone has no memory left for the photo. Close other apps and take it again.');
  // What was see-through would turn black.
  pen.fillStyle = '#fff';
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.imageSmoothingQuality = 'high';
  pen.drawImage(picture, 0, 0, canvas.width, canvas.height);
  const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/jpeg', 0.82));
  if (!blob) throw new PhotoFault('This phone has no memory left for the photo. Close other apps and take it again.');
  return blob;
}

async function hashOf(blob: Blob): Promise<string> {
  // Browsers leave it out of pages that came without https.
  if (!window.isSecureContext) throw new PhotoFault('Photos need an https address. Ask the owner for it.');
  const hash = await crypto.subtle.digest('SHA-256', await blob.arrayBuffer());
  return [...new Uint8Array(hash)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
