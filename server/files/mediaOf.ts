/** What a file is, by its first bytes; its name and what the sender calls it are not asked. */

export type Media = 'jpeg' | 'png' | 'webp' | 'heic' | 'pdf' | null;

const HEIC_BRANDS = new Set(['heic', 'heix', 'hevc', 'heim', 'heis', 'hevm', 'hevs', 'mif1', 'msf1']);

/** The kind of a file that this server knows by name, or null. */
export function mediaOf(bytes: Buffer): Media {
  const text = (from: number, to: number): string => bytes.toString('latin1', from, to);
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'jpeg';
  if (text(0, 8) === '\x89PNG\r\n\x1a\n') return 'png';
  if (text(0, 4) === 'RIFF' && text(8, 12) === 'WEBP') return 'webp';
  if (text(4, 8) === 'ftyp' && HEIC_BRANDS.has(text(8, 12))) return 'heic';
  if (text(0, 5) === '%PDF-') return 'pdf';
  return null;
}
