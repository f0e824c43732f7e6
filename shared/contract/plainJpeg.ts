/**
 * A JPEG that holds a picture and nothing else, by the marker segments of ISO/IEC 10918-1 (ITU-T T.81), annex B: no Exif, no position,
 * no comment, no colour profile, no thumbnail. A device makes its photos so, and the server keeps such a one byte for byte; that is
 * how a photo has its name before it has reached the server.
 */

const APP0 = 0xe0;
const LAST_APP = 0xef;
const COM = 0xfe;
const SOS = 0xda;
const EOI = 0xd9;
/** DHT, DQT, DRI, the frame headers of baseline and progressive pictures, and the scan. */
const OF_THE_PICTURE = new Set([0xc4, 0xdb, 0xdd, 0xc0, 0xc1, 0xc2, SOS]);
/** A whole APP0 of JFIF without a thumbnail: marker, length, “JFIF\0”, version, units, densities, two zeros. */
const JFIF_BYTES = 18;
const JFIF = [0x4a, 0x46, 0x49, 0x46, 0];

interface Segment {
  readonly marker: number;
  /** first byte, which is the one before its marker */
  readonly from: number;
  /** behind its last byte */
  readonly to: number;
}

/** The segment that begins at `from`, or null when none does. */
function segmentAt(bytes: Uint8Array, from: number): Segment | null {
  const to = from + 2 + ((bytes[from + 2] ?? 0) << 8) + (bytes[from + 3] ?? 0);
  return bytes[from] === 0xff && to >= from + 4 && to <= bytes.length ? { marker: bytes[from + 1] ?? 0, from, to } : null;
}

const isJpeg = (bytes: Uint8Array): boolean => bytes[0] === 0xff && bytes[1] === 0xd8;

function isJfif(bytes: Uint8Array, { marker, from, to }: Segment): boolean {
  return marker === APP0 && from === 2 && to - from === JFIF_BYTES && JFIF.every((byte, i) => bytes[from + 4 + i] === byte);
}

/** Place of the next marker after entropy-coded data: stuffed zeros and restart markers belong to the data. */
function endOfScan(bytes: Uint8Array, from: number): number {
  let at = bytes.indexOf(0xff, from);
  while (at >= 0 && at + 1 < bytes.length) {
    const next = bytes[at + 1] ?? 0;
    if (next !== 0 && !(next >= 0xd0 && next <= 0xd7)) return at;
    at = bytes.indexOf(0xff, at + 2);
  }
  return bytes.length;
}

/** True when no byte of the file is there for anything but the picture. It says nothing about whether the picture can be decoded. */
export function isPlainJpeg(bytes: Uint8Array): boolean {
  if (!isJpeg(bytes)) return false;
  let segment = segmentAt(bytes, 2);
  while (segment !== null) {
    if (!OF_THE_PICTURE.has(segment.marker) && !isJfif(bytes, segment)) return false;
    const next = segment.marker === SOS ? endOfScan(bytes, segment.to) : segment.to;
    if (segment.marker === SOS && bytes[next + 1] === EOI) return next + 2 === bytes.length;
    segment = segmentAt(bytes, next);
  }
  return false;
}

/** The same picture without what else a camera or a browser writes before it; null when it is no JPEG. */
export function plainJpeg(bytes: Uint8Array): Uint8Array<ArrayBuffer> | null {
  if (!isJpeg(bytes)) return null;
  const kept = [bytes.subarray(0, 2)];
  let segment = segmentAt(bytes, 2);
  while (segment !== null && segment.marker !== SOS) {
    const told = (segment.marker >= APP0 && segment.marker <= LAST_APP) || segment.marker === COM;
    if (!told || isJfif(bytes, segment)) kept.push(bytes.subarray(segment.from, segment.to));
    segment = segmentAt(bytes, segment.to);
  }
  if (segment === null) return null;
  kept.push(bytes.subarray(segment.from));
  const plain = new Uint8Array(kept.reduce((sum, part) => sum + part.length, 0));
  let to = 0;
  for (const part of kept) {
    plain.set(part, to);
    to += part.length;
  }
  return plain;
}
