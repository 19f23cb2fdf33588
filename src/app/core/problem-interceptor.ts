import { HttpErrorResponse, type HttpInterceptorFn } from '@angular/common/http';
import { catchError, throwError } from 'rxjs';
import { ApiProblem, type FieldProblem } from './api-problem';

/** Turns every failed answer into an `ApiProblem`, so that nobody else looks at HTTP errors. */
export const problemInterceptor: HttpInterceptorFn = (request, next) =>
  next(request).pipe(
    catchError((error: unknown) => throwError(() => (error instanceof HttpErrorResponse ? problemOf(error) : error))),
  );

function problemOf(error: HttpErrorResponse): ApiProblem {
  const body = readBody(error.error);
  const title = typeof body['title'] === 'string' ? body['title'] : titleOf(error.status);
  const detail = typeof body['detail'] === 'string' ? body['detail'] : undefined;
  const retryAfter = Number(error.headers.get('retry-after') ?? Number.NaN);
  return new ApiProblem(
    error.status,
    title,
    detail,
    Array.isArray(body['errors']) ? body['errors'].filter(isFieldProblem) : [],
    Number.isFinite(retryAfter) ? retryAfter : undefined,
    typeof body['code'] === 'string' ? body['code'] : undefined,
  );
}

function readBody(body: unknown): Record<string, unknown> {
  if (typeof body === 'object' && body !== null) return body as Record<string, unknown>;
  if (typeof body !== 'string') return {};
  try {
    const parsed: unknown = JSON.parse(body);
    return typeof parsed === 'object' && parsed !== null ? (parsed as Record<string, unknown>) : {};
  } catch (error) {
    // Something between here and the server answered with a page instead of a problem document.
    if (error instanceof SyntaxError) return {};
    throw error;
  }
}

function titleOf(status: number): string {
  if (status === 0 || status === 504) return 'The server cannot be reached';
  if (status === 401) return 'Sign in again';
  if (status === 403) return 'That is not yours to do';
  if (status === 404) return 'Not found';
  return 'The server could not do it';
}

function isFieldProblem(item: unknown): item is FieldProblem {
  if (typeof item !== 'object' || item === null) return false;
  const { pointer, detail } = item as Record<string, unknown>;
  return typeof pointer === 'string' && typeof detail === 'string';
}
