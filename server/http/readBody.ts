/** Reading a JSON body, after the session has been checked. */
import express from 'express';
import type { Request, Response } from 'express';

import { ProblemError } from '../problems';

export const BODY_LIMIT_BYTES = 1_000_000;

const parseJson = express.json({ limit: BODY_LIMIT_BYTES, strict: true, type: 'application/json' });

// Neither can be stored as PostgreSQL text, and no person types one.
const UNSTORABLE = /\0|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/;

/** Parses the body of `req` as JSON; throws a problem when it is not JSON, too large, too deep or holds characters that no text can. */
export async function readBody(req: Request, res: Response): Promise<unknown> {
  if (req.is('application/json') === false && Number(req.headers['content-length'] ?? 0) > 0) throw new ProblemError('not-json');
  await new Promise<void>((resolve, reject) => {
    parseJson(req, res, (error?: unknown) => (error === undefined ? resolve() : reject(error instanceof Error ? error : new Error('unreadable body'))));
  });
  const body: unknown = req.body;
  if (body === undefined) throw new ProblemError('bad-json', 'The request has no JSON body.');
  refuseUnstorable(body, 0);
  return body;
}

function refuseUnstorable(value: unknown, depth: number): void {
  if (depth > 64) throw new ProblemError('bad-input', 'The request is nested too deeply.');
  if (typeof value === 'string') {
    if (UNSTORABLE.test(value)) throw new ProblemError('bad-input', 'A text holds characters that cannot be stored.');
  } else if (Array.isArray(value)) {
    for (const item of value) refuseUnstorable(item, depth + 1);
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, item] of Object.entries(value)) {
      refuseUnstorable(key, depth + 1);
      refuseUnstorable(item, depth + 1);
    }
  }
}
