/** One thing that is wrong with a field: a JSON pointer (RFC 6901) into what was sent, and the words. */
export interface FieldProblem {
  readonly pointer: string;
  readonly detail: string;
}

/** A problem document (RFC 9457). `code` is our extension: the last part of `type`, for programs. */
export interface ProblemDocument {
  readonly type: string;
  readonly code: string;
  readonly title: string;
  readonly status: number;
  readonly detail?: string;
  readonly instance?: string;
  readonly errors?: readonly FieldProblem[];
}

/** A failure that the caller may know about. Its message is written for the person at the other end. */
export abstract class AppError extends Error {
  abstract readonly status: number;
  abstract readonly code: string;
  abstract readonly title: string;
  readonly errors?: readonly FieldProblem[];
  readonly headers: Readonly<Record<string, string>> = {};

  constructor(detail: string) {
    super(detail);
    this.name = new.target.name;
  }
}

export class BadRequest extends AppError {
  readonly status = 400;
  readonly code: string = 'bad-request';
  readonly title = 'The request can not be read';
}

export class InvalidQuery extends AppError {
  readonly status = 400;
  readonly code = 'invalid-query';
  readonly title = 'The query is not valid';
  constructor(
    detail: string,
    override readonly errors: readonly FieldProblem[],
  ) {
    super(detail);
  }
}

export class NotSignedIn extends AppError {
  readonly status = 401;
  readonly code: string = 'not-signed-in';
  readonly title = 'Not signed in';
  override readonly headers = { 'WWW-Authenticate': 'Bearer' };
}

/** The same words for a wrong name and a wrong password: neither can be guessed by trying. */
export class WrongNameOrPassword extends NotSignedIn {
  override readonly code = 'wrong-name-or-password';
  constructor() {
    super('The name or the password is wrong.');
  }
}

export class SessionEnded extends NotSignedIn {
  override readonly code = 'session-ended';
}

export class NotAllowed extends AppError {
  readonly status = 403;
  readonly code: string = 'not-allowed';
  readonly title = 'Not allowed';
}

export class UnknownTablet extends NotAllowed {
  override readonly code = 'unknown-tablet';
}

export class WrongSignature extends NotAllowed {
  override readonly code = 'wrong-signature';
}

export class NotFound extends AppError {
  readonly status = 404;
  readonly code = 'not-found';
  readonly title = 'Not found';
}

export class Conflict extends AppError {
  readonly status = 409;
  readonly code = 'conflict';
  readonly title = 'It stands otherwise already';
}

export class TooLarge extends AppError {
  readonly status = 413;
  readonly code = 'too-large';
  readonly title = 'Too large';
}

export class WrongMediaType extends AppError {
  readonly status = 415;
  readonly code = 'wrong-media-type';
  readonly title = 'Not the kind of content that belongs here';
}

export class Invalid extends AppError {
  readonly status = 422;
  readonly code: string = 'invalid';
  readonly title = 'What was sent is not valid';
  constructor(
    detail: string,
    override readonly errors: readonly FieldProblem[],
  ) {
    super(detail);
  }
}

export class LockedOut extends AppError {
  readonly status = 429;
  readonly code = 'locked-out';
  readonly title = 'Too many tries';
  override readonly headers: Readonly<Record<string, string>>;
  constructor(waitS: number) {
    super(`Too many wrong tries. Try again in ${waitS} s.`);
    this.headers = { 'Retry-After': String(waitS) };
  }
}

export class NotReady extends AppError {
  readonly status = 503;
  readonly code = 'not-ready';
  readonly title = 'Not ready';
  override readonly headers = { 'Retry-After': '5' };
}

/** The URI of a kind of problem. */
export function problemType(code: string): string {
  return `urn:bayhand:problem:${code}`;
}

export function problemOf(error: AppError, instance: string): ProblemDocument {
  return {
    type: problemType(error.code),
    code: error.code,
    title: error.title,
    status: error.status,
    detail: error.message,
    instance,
    ...(error.errors === undefined ? {} : { errors: error.errors }),
  };
}
