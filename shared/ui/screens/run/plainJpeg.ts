/** A JPEG without anything but its picture: no position, no camera, no comment, no thumbnail (segments of ITU-T T.81, annex B). */

const SOS = 0xda;
const APP0 = 0xe0;
const COM = 0xfe;
/** The APP0 of JFIF without a thumbnail. */
const JFIF_BYTES = 16;

/** The same picture with only the segments that draw it; null when it is not a JPEG from start to end. */
export function plainJpeg(bytes: Uint8Array): Uint8Array<ArrayBuffer> | null {
  if (bytes[0] !== 0xff || bytes[1] !== 0xd8) return null;
  const kept: Uint8Array[] = [bytes.subarray(0, 2)];
  let at = 2;
  for (;;) {
    const marker = bytes[at + 1] ?? 0;
    const end = at + 2 + ((bytes[at + 2] ?? 0) << 8) + (bytes[at + 3] ?? 0);
    if (bytes[at] !== 0xff || end <= at + 3 || end > bytes.length) return null;
    if (marker === SOS) break;
    const told = (marker >= APP0 && marker <= 0xef) || marker === COM;
    const jfif = marker === APP0 && at === 2 && end - at === JFIF_BYTES + 2;
    if (!told || jfif) kept.push(bytes.subarray(at, end));
    at = end;
  }
  kept.push(bytes.subarray(at));
  const plain = new Uint8Array(kept.reduce((sum, part) => sum + part.length, 0));
  let to = 0;
  for (const part of kept) {
    plain.set(part, to);
    to += part.length;
  }
  return plain;
}
