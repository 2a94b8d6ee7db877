import type { Request, Response } from 'express';
import multer, { MulterError } from 'multer';
import { AppError, badField } from '#server/errors.ts';

/** Reads one file of a multipart body into memory (`req.file`); other bodies are left alone. */
export function readUpload(field: string, mostBytes: number) {
  const read = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: mostBytes, files: 1, fields: 4, fieldSize: 1000, parts: 5 },
  }).single(field);
  return (req: Request, res: Response) =>
    new Promise<void>((resolve, reject) => {
      read(req, res, (error: unknown) => (error ? reject(asAppError(error)) : resolve()));
    });

  function asAppError(error: unknown): unknown {
    const words = `must be ${Math.floor(mostBytes / 1024 / 1024)} MB or smaller`;
    if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE')
      return new AppError('tooLarge', `Please look at ${field}: ${words}.`, {
        fields: { [field]: words },
      });
    // Anything else busboy or multer says is about what was sent.
    return badField(
      field,
      `must be one file in the field "${field}" of a multipart/form-data body`,
    );
  }
}
