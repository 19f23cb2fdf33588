/** One field's mistake in a problem document. */
export interface FieldProblem {
  /** JSON pointer to the field, `/name`. */
  readonly pointer: string;
  readonly detail: string;
}

/**
 * A failed call to the server, whatever went wrong: what a problem document (RFC 9457) said, or that nobody answered.
 * Every call through HttpClient fails with this alone.
 */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    /** The HTTP status; 0 when no answer came. */
    readonly status: number,
    readonly title: string,
    readonly detail: string | undefined,
    readonly fields: readonly FieldProblem[],
    /** Seconds until a new try makes sense, where the server says so. */
    readonly retryAfterS: number | undefined,
    /** The server's name for this kind of failure, `unknown-tablet`; undefined where it gave none. */
    readonly code: string | undefined,
  ) {
    super(detail ?? title);
  }

  /**
   * Whether there is no network or no server: 0, the 504 that the service worker makes up when it is offline, and the
   * gateway's 502 and 503. Not a fault of the request: it can be sent again as it is.
   */
  get isUnavailable(): boolean {
    return this.status === 0 || this.status === 502 || this.status === 503 || this.status === 504;
  }
}
