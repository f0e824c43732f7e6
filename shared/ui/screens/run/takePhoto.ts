/** Taking a photo with this device: chosen by the person, drawn anew, named by its content. */
import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';

import { plainJpeg } from '@/shared/contract/plainJpeg';

/** Longest side of a photo on its way to the server; enough to read a part's marking. */
const LONGEST_PX = 2400;
const QUALITY = 0.85;

export interface TakenPhoto {
  /** SHA-256 of the bytes */
  hash: string;
  photo: Blob;
}

/**
 * Opens the camera (or the device's pictures) and resolves to what was chosen, or to null when the person went back.
 * @param from `camera` asks a phone for its rear camera; other devices show their files
 */
export function choosePhoto(from: 'camera' | 'device'): Promise<File | null> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = 'image/*';
    if (from === 'camera') input.setAttribute('capture', 'environment');
    input.addEventListener('change', () => resolve(input.files?.[0] ?? null));
    input.addEventListener('cancel', () => resolve(null));
    input.click();
  });
}

/**
 * Draws the photo anew, upright and at most 2400 pixels long, so that nothing but what can be seen leaves this device. Throws a sentence
 * for a picture that this browser cannot read.
 */
export async function preparePhoto(file: Blob): Promise<TakenPhoto> {
  const picture = await createImageBitmap(file, { imageOrientation: 'from-image' }).catch(() => null);
  if (picture === null) throw new Error('This picture cannot be read here. Take it again, or set the camera to take JPEG.');
  const shrink = Math.min(1, LONGEST_PX / Math.max(picture.width, picture.height));
  const canvas = document.createElement('canvas');
  canvas.width = Math.max(1, Math.round(picture.width * shrink));
  canvas.height = Math.max(1, Math.round(picture.height * shrink));
  const pen = canvas.getContext('2d');
  if (pen === null) throw new Error('This browser cannot draw the photo. Close other pages, then take it again.');
  // what is see-through would turn black
  pen.fillStyle = '#ffffff';
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.drawImage(picture, 0, 0, canvas.width, canvas.height);
  picture.close();
  const drawn = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/jpeg', QUALITY));
  const plain = drawn === null ? null : plainJpeg(new Uint8Array(await drawn.arrayBuffer()));
  if (plain === null) throw new Error('This browser cannot make a JPEG of the photo. Take it with another device.');
  return { hash: bytesToHex(sha256(plain)), photo: new Blob([plain], { type: 'image/jpeg' }) };
}
