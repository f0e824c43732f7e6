/** Whether a JPEG holds a picture and nothing else, by the marker segments of ISO/IEC 10918-1 (ITU-T T.81), annex B. */

const APP0 = 0xe0;
/** DHT, DQT, DRI, and the frame headers of baseline and progressive pictures */
const OF_THE_PICTURE = new Set([0xc4, 0xdb, 0xdd, 0xc0, 0xc1, 0xc2]);
const SOS = 0xda;
const EOI = 0xd9;
/** The longest APP0 of JFIF without a thumbnail: length, “JFIF\0”, version, units, densities, two zeros. */
const JFIF_BYTES = 16;

/**
 * True when the file is a JPEG of picture segments alone: no Exif, no position, no comment, no colour profile, no thumbnail and no
 * byte after its end. Such a file is kept as it was sent, so that the device that took it can name it by its hash before it has
 * reached the server. It says nothing about whether the picture can be decoded.
 */
export function isPlainJpeg(bytes: Buffer): boolean {
  if (bytes.length < 4 || bytes.readUInt16BE(0) !== 0xffd8) return false;
  let at = 2;
  while (at + 4 <= bytes.length) {
    if (bytes[at] !== 0xff) return false;
    const marker = bytes[at + 1] ?? 0;
    const length = bytes.readUInt16BE(at + 2);
    if (length < 2 || at + 2 + length > bytes.length) return false;
    if (marker === APP0) {
      if (at !== 2 || length !== JFIF_BYTES || bytes.toString('latin1', at + 4, at + 9) !== 'JFIF\0') return false;
    } else if (marker !== SOS && !OF_THE_PICTURE.has(marker)) return false;
    at += 2 + length;
    if (marker === SOS) {
      at = endOfScan(bytes, at);
      if (bytes[at + 1] === EOI) return at + 2 === bytes.length;
    }
  }
  return false;
}

/** Place of the next marker after entropy-coded data: stuffed zeros and restart markers belong to the data. */
function endOfScan(bytes: Buffer, from: number): number {
  let at = bytes.indexOf(0xff, from);
  while (at >= 0 && at + 1 < bytes.length) {
    const next = bytes[at + 1] ?? 0;
    if (next !== 0 && !(next >= 0xd0 && next <= 0xd7)) return at;
    at = bytes.indexOf(0xff, at + 2);
  }
  return bytes.length;
}
