import type { ErrorRequestHandler, RequestHandler } from 'express';
import { MulterError } from 'multer';
import type { Logger } from 'pino';
import { ProblemError } from './problems.ts';

export const nothingHere: RequestHandler = () => {
  throw new ProblemError('not-found', 'There is nothing at this address.');
};

/** Everything thrown ends here: known problems in their words, the rest logged with the request's id and told plainly. */
export function answerErrors(log: Logger): ErrorRequestHandler {
  return (error, req, res, next) => {
    const requestId = String(res.locals.requestId ?? '');
    const known = asProblem(error);
    if (!known) log.error({ err: error, requestId, method: req.method }, 'request failed');
    if (res.headersSent) {
      next(error);
      return;
    }
    const problem = (known ?? new ProblemError('failed', `Please try again; if it stays, tell us this number: ${requestId}`)).toProblem(requestId);
    res.status(problem.status).type('application/problem+json').set('Cache-Control', 'no-store').send(JSON.stringify(problem));
  };
}

function asProblem(error: unknown): ProblemError | null {
  if (error instanceof ProblemError) return error;
  if (error instanceof MulterError) {
    return error.code === 'LIMIT_FILE_SIZE'
      ? new ProblemError('too-large', 'This file is larger than 40 MB. Please send a smaller one.')
      : new ProblemError('bad-input', 'Please send one file, in the field named "file".');
  }
  const type = (error as { type?: string }).type ?? '';
  const status = (error as { status?: number }).status ?? 0;
  if (type === 'entity.too.large') return new ProblemError('too-large', 'This request is larger than we take.');
  if (type.startsWith('entity.') || type === 'encoding.unsupported' || type === 'charset.unsupported' || type === 'request.aborted') {
    return new ProblemError('bad-input', 'The request could not be read as JSON.');
  }
  if (error instanceof URIError) return new ProblemError('not-found', 'There is nothing at this address.');
  // The multipart reader throws plain errors on damaged bodies.
  if (error instanceof Error && /multipart|boundary|unexpected end of form/i.test(error.message)) {
    return new ProblemError('bad-input', 'The upload broke off or is not a file upload. Please try again.');
  }
  if (status >= 400 && status < 500) return new ProblemError('bad-input', 'The request does not fit.');
  return null;
}
