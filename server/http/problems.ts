import { problemCodes, type Problem, type ProblemCode } from '../../shared/api/problem.ts';

/** An error that a person will read; the transport turns it into problem+json. */
export class ProblemError extends Error {
  readonly code: ProblemCode;
  readonly fields: Problem['fields'];
  readonly current: unknown;

  constructor(code: ProblemCode, detail: string, more: { fields?: Problem['fields']; current?: unknown } = {}) {
    super(detail);
    this.code = code;
    this.fields = more.fields;
    this.current = more.current;
  }

  toProblem(requestId?: string): Problem {
    const { status, title } = problemCodes[this.code];
    return {
      type: 'about:blank', title, status, detail: this.message, code: this.code,
      ...(requestId ? { requestId } : {}),
      ...(this.fields ? { fields: this.fields } : {}),
      ...(this.current !== undefined ? { current: this.current } : {}),
    };
  }
}

export const notFound = (what: string) => new ProblemError('not-found', `We cannot find this ${what}.`);
