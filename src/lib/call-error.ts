import { Problem } from '../../shared/api/problem.ts';

/** What every failed call throws: the problem as the server told it, or one made here where no answer came. */
export class CallError extends Error {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.name = 'CallError';
    this.problem = problem;
  }

  get code(): string {
    return this.problem.code;
  }

  get status(): number {
    return this.problem.status;
  }
}

/** Whether an error is a `CallError`, by code if one is given. */
export function isCallError(error: unknown, code?: string): error is CallError {
  return error instanceof CallError && (code === undefined || error.code === code);
}

/** No answer came: the line is down, or the server is. Status 0, code `unreachable`. */
export function unreachable(): CallError {
  return new CallError({
    type: 'about:blank', title: 'No connection', status: 0, code: 'unreachable',
    detail: 'The server could not be reached. Check the connection and try again.',
  });
}

/** The error of an answer that is not 2xx; `body` is its parsed JSON, or undefined where it has none. */
export function errorOfAnswer(status: number, body: unknown): CallError {
  const told = Problem.safeParse(body);
  if (told.success) return new CallError(told.data);
  if (status === 502 || status === 503 || status === 504) {
    return new CallError({
      type: 'about:blank', title: 'Not available just now', status, code: 'unavailable',
      detail: 'The server does not answer just now. Try again in a moment.',
    });
  }
  return new CallError({ type: 'about:blank', title: 'Something went wrong on our side', status, code: 'failed' });
}

/** The error of a 2xx answer whose shape is not what the contract says. */
export function misshapen(path: string, requestId: string | undefined): CallError {
  return new CallError({
    type: 'about:blank', title: 'The answer could not be read', status: 200, code: 'misshapen', requestId,
    detail: `The answer to ${path} does not have the expected shape. Reload the page; the program may have been renewed meanwhile.`,
  });
}
