import type { ErrorRequestHandler } from 'express';
import multer from 'multer';
import type { Logger } from 'pino';
import { AppError, badInput, tooLarge } from './app-error';

/** The one place where errors become answers, each an RFC 9457 problem. */
export function errorHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    const refusal = toAppError(error);
    if (refusal.status >= 500) logger.error({ err: error, url: req.path }, 'a request failed');
    if (res.headersSent) {
      next(error); // Express cuts the connection: half an answer must not look whole
      return;
    }
    res
      .status(refusal.status)
      .set(refusal.extras.headers ?? {})
      .type('application/problem+json')
      .send(JSON.stringify(refusal.toProblem()));
  };
}

function toAppError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  if (error instanceof multer.MulterError) return fromUpload(error);
  return (
    fromExpress(error) ?? new AppError(500, 'internal', 'The server failed; its log says why.')
  );
}

function fromUpload(error: multer.MulterError): AppError {
  if (error.code === 'LIMIT_FILE_SIZE') return tooLarge('The file is too large.');
  return badInput('The upload cannot be used.', [
    { path: error.field ?? '', message: error.message },
  ]);
}

/** Express and its body parser throw errors with `status`, and `expose` where people may read them. */
function fromExpress(error: unknown): AppError | undefined {
  if (!(error instanceof Error) || !('status' in error)) return undefined;
  const { status } = error;
  if (typeof status !== 'number' || status < 400 || status >= 500) return undefined;
  if (status === 413) return tooLarge('The body of the request is too large.');
  return new AppError(status, 'bad-request', 'The request cannot be read.');
}
