/** Sending a kept file: in whole or in part, to this reader's cache only. */
import { pipeline } from 'node:stream/promises';

import type { Request, Response } from 'express';

import type { FileRow } from '@/db/tables';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { byteRange } from './byteRange';
import { keyOf } from './keepFile';

/** Answers with the bytes. A content never changes under its hash, so a reader may keep it for a year; only its own cache may. */
export async function sendFile(parts: Parts, workshop: string, file: FileRow, size: 'full' | 'small', req: Request, res: Response): Promise<void> {
  const small = size === 'small' && file.media === 'image/jpeg';
  const etag = `"${file.hash}${small ? '-small' : ''}"`;
  res.setHeader('ETag', etag);
  res.setHeader('Cache-Control', 'private, max-age=31536000, immutable');
  res.setHeader('Vary', 'Cookie');
  // whatever a reader does with it, it runs nothing and reaches nothing
  res.setHeader('Content-Security-Policy', "default-src 'none'; style-src 'unsafe-inline'; sandbox");
  res.setHeader('X-Content-Type-Options', 'nosniff');
  if (req.headers['if-none-match'] === etag) {
    res.status(304).end();
    return;
  }
  const length = small ? null : file.bytes;
  const range = length === null || (req.headers['if-range'] ?? etag) !== etag ? null : byteRange(req.headers.range, length);
  if (range === 'none') {
    res.setHeader('Content-Range', `bytes */${String(file.bytes)}`);
    throw new ProblemError('bad-range');
  }
  const found = await parts.objects.get(keyOf(workshop, file.hash, small ? 'small' : 'full'), range ?? undefined);
  if (found === null) throw new Error(`The object store has lost ${file.hash}`);
  res.status(range === null ? 200 : 206);
  if (length !== null) res.setHeader('Accept-Ranges', 'bytes');
  if (range !== null) res.setHeader('Content-Range', `bytes ${String(range.from)}-${String(range.to)}/${String(file.bytes)}`);
  res.setHeader('Content-Type', file.media);
  res.setHeader('Content-Length', found.length);
  res.setHeader('Content-Disposition', file.media === 'image/jpeg' ? 'inline' : `attachment; filename="${file.hash.slice(0, 12)}.pdf"`);
  // a reader who goes away in the middle is no fault of the server
  await pipeline(found.stream, res).catch((error: unknown) => {
    if (!res.destroyed && !res.writableEnded) throw error;
  });
}
