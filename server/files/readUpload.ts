/** Reading the one file of a multipart form. */
import type { Request, Response } from 'express';
import multer, { memoryStorage, MulterError } from 'multer';

import { FILE_LIMIT_BYTES } from '@/shared/contract/files';

import { ProblemError } from '../problems';

// In memory: nothing of what was sent touches a disk before it is known to be a picture, and its name is never a path.
const take = multer({
  storage: memoryStorage(),
  limits: { fileSize: FILE_LIMIT_BYTES, files: 1, fields: 0, parts: 1, headerPairs: 20 },
  defParamCharset: 'utf8',
}).single('file');

const TOO_LARGE = `This file is too large: at most ${String(FILE_LIMIT_BYTES / 1e6)} megabytes are taken.`;
/** Room for the boundaries and headers of the form around the file. */
const FORM_BYTES = 10_000;

/** The bytes of the field `file`. Throws a problem for no form, no file, more than one, or too large a one. */
export async function readUpload(req: Request, res: Response): Promise<Buffer> {
  if (req.is('multipart/form-data') === false) throw new ProblemError('bad-input', 'The file must be sent as a form with one field “file”.');
  if (Number(req.headers['content-length'] ?? 0) > FILE_LIMIT_BYTES + FORM_BYTES) {
    // what still comes is not read: the connection ends with the answer
    res.setHeader('Connection', 'close');
    throw new ProblemError('too-large', TOO_LARGE);
  }
  await new Promise<void>((resolve, reject) => {
    take(req, res, (error: unknown) => (error === undefined || error === null ? resolve() : reject(toProblem(error))));
  });
  const { file } = req;
  if (file === undefined || file.size === 0) throw new ProblemError('bad-input', 'No file came: choose one, then send it again.');
  return file.buffer;
}

function toProblem(error: unknown): ProblemError {
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') return new ProblemError('too-large', TOO_LARGE);
  if (error instanceof MulterError) return new ProblemError('bad-input', 'The form must hold one file, in its field “file”, and nothing else.');
  return new ProblemError('bad-input', 'The form could not be read to its end. Send it again.');
}
