/** Making a picture safe to keep and to show: only what can be seen stays. */
import { createHash } from 'node:crypto';

import type { Sharp } from 'sharp';

import { isPlainJpeg } from '@/shared/contract/plainJpeg';

import { ProblemError } from '../problems';
import { mediaOf } from './mediaOf';

/** Longest side of a photo that is kept. */
export const MAX_SIDE_PX = 3000;
/** Longest side of the small picture of lists. */
export const SMALL_SIDE_PX = 480;
/** A picture that would unpack to more is refused before it is unpacked. */
export const MAX_PIXELS = 50_000_000;
const DECODE_SECONDS = 20;

export interface CleanPhoto {
  readonly bytes: Buffer;
  /** SHA-256 of `bytes` */
  readonly hash: string;
  readonly width: number;
  readonly height: number;
  readonly small: Buffer;
}

const UNREADABLE = 'This picture cannot be read. It may be damaged; take it again, or send another as JPEG, PNG or WebP.';
const SAY = {
  heic: 'This is a HEIC photo, which cannot be read here. Set the camera to take JPEG (“most compatible”), or send it as JPEG.',
  pdf: 'This is a PDF, not a picture.',
} as const;

/**
 * A photo as it is kept: JPEG, turned upright, at most 3000 pixels long, without Exif, position or anything else but the picture. A
 * JPEG that is so already is kept byte for byte. Throws the problem `bad-file` with a sentence for whatever is no picture.
 */
export async function cleanPhoto(sent: Buffer): Promise<CleanPhoto> {
  const media = mediaOf(sent);
  if (media === 'heic' || media === 'pdf') throw new ProblemError('bad-file', SAY[media]);
  if (media === null) throw new ProblemError('bad-file', 'This file is no picture: JPEG, PNG and WebP are taken, known by their content and not by their name.');
  try {
    const { width, height, pages } = await (await open(sent)).metadata();
    if (width * height > MAX_PIXELS) throw new ProblemError('bad-file', `This picture would unpack to ${String(Math.round((width * height) / 1e6))} million pixels; ${String(MAX_PIXELS / 1e6)} million are taken.`);
    if ((pages ?? 1) > 1) throw new ProblemError('bad-file', 'This picture moves. Send a still one.');
    const plain = media === 'jpeg' && Math.max(width, height) <= MAX_SIDE_PX && isPlainJpeg(sent);
    const bytes = plain
      ? sent
      : await (await open(sent)).autoOrient().resize({ width: MAX_SIDE_PX, height: MAX_SIDE_PX, fit: 'inside', withoutEnlargement: true }).flatten({ background: '#ffffff' }).toColourspace('srgb').jpeg({ quality: 85 }).toBuffer();
    // Decoding the whole of what is kept is the proof that it is a picture to its end.
    const small = await (await open(bytes)).resize({ width: SMALL_SIDE_PX, height: SMALL_SIDE_PX, fit: 'inside', withoutEnlargement: true }).jpeg({ quality: 75 }).toBuffer();
    const kept = await (await open(bytes)).metadata();
    return { bytes, hash: createHash('sha256').update(bytes).digest('hex'), width: kept.width, height: kept.height, small };
  } catch (error) {
    if (error instanceof ProblemError) throw error;
    throw new ProblemError('bad-file', /pixel limit/i.test(String(error)) ? `This picture is too large: at most ${String(MAX_PIXELS / 1e6)} million pixels are taken.` : UNREADABLE);
  }
}

/** The picture library, loaded at the first photo; it keeps to one thread a picture, because the others belong to requests. */
const library = memoise(async () => {
  const { default: sharp } = await import('sharp');
  sharp.concurrency(1);
  sharp.cache(false);
  return sharp;
});

async function open(bytes: Buffer): Promise<Sharp> {
  const sharp = await library();
  return sharp(bytes, { limitInputPixels: MAX_PIXELS, failOn: 'error', sequentialRead: true }).timeout({ seconds: DECODE_SECONDS });
}

function memoise<T>(make: () => Promise<T>): () => Promise<T> {
  let made: Promise<T> | undefined;
  return () => (made ??= make());
}
