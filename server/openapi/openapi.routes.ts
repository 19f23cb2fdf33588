import { openRoute, type Route } from '../http/route';
import { openApiDocument } from './openapi-document';

/** The description of all these routes and of itself. */
export function withOpenApi(routes: readonly Route[]): readonly Route[] {
  let document: object | undefined;
  const all: Route[] = [
    ...routes,
    openRoute(
      'get',
      '/api/openapi.json',
      { summary: 'This description.', answers: { 200: 'An OpenAPI document.' } },
      async () => Promise.resolve({ status: 200, json: (document ??= openApiDocument(all)) }),
    ),
  ];
  return all;
}
