import type { Route, RouteBody, RouteSays } from '../http/route';
import type { Dto } from '../http/validated';
import { schemaOf, type JsonSchema } from './dto-schema';

/** Describes every route of the table (OpenAPI 3.1.0), from the same DTOs that check it. */
export function openApiDocument(routes: readonly Route[]): object {
  const schemas: Record<string, JsonSchema> = {};
  const paths: Record<string, Record<string, object>> = {};
  for (const route of routes) {
    const path = route.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operationOf(route, schemas) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Bayhand', version: '1', description: 'Runs of bench tests: delivery, records, procedures.' },
    paths,
    components: {
      securitySchemes: { accessToken: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
      schemas: { ...schemas, Problem: problemSchema },
    },
  };
}

function operationOf(route: Route, schemas: Record<string, JsonSchema>): object {
  const { says, roles } = route;
  return {
    summary: says.summary,
    ...(roles === 'anyone' ? { security: [] } : { security: [{ accessToken: [] }], 'x-roles': roles }),
    parameters: [...pathParameters(route.path), ...queryParameters(says, schemas)],
    ...(says.body === undefined ? {} : { requestBody: requestBody(says.body, schemas) }),
    responses: { ...answersOf(says, schemas), default: problemAnswer },
  };
}

function pathParameters(path: string): object[] {
  return [...path.matchAll(/:(\w+)/g)].map(([, name]) => {
    return { name, in: 'path', required: true, schema: { type: 'string' } };
  });
}

function queryParameters({ query }: RouteSays<object, object>, schemas: Record<string, JsonSchema>): object[] {
  if (query === undefined) return [];
  const { properties = {}, required = [] } = schemaOf(query, schemas);
  return Object.entries(properties).map(([name, schema]) => {
    return { name, in: 'query', required: required.includes(name), schema };
  });
}

function requestBody(body: RouteBody<object>, schemas: Record<string, JsonSchema>): object {
  const described = `At most ${body.limitBytes} bytes.`;
  if (body.kind === 'bytes') {
    return { required: true, description: described, content: { 'application/octet-stream': {} } };
  }
  const dto = body.kind === 'json' ? body.dto : body.describedBy;
  const schema = dto === undefined ? { type: 'object' } : referenceTo(dto, schemas);
  return { required: true, description: described, content: { 'application/json': { schema } } };
}

function answersOf({ answers }: RouteSays<object, object>, schemas: Record<string, JsonSchema>): object {
  const entries = Object.entries(answers).map(([status, answer]) => {
    if (typeof answer === 'string') return [status, { description: answer }];
    const schema =
      typeof answer === 'function'
        ? referenceTo(answer, schemas)
        : { type: 'array', items: referenceTo(answer[0], schemas) };
    return [status, { description: 'The answer.', content: { 'application/json': { schema } } }];
  });
  return Object.fromEntries(entries) as object;
}

function referenceTo(dto: Dto<object>, schemas: Record<string, JsonSchema>): JsonSchema {
  schemas[dto.name] ??= schemaOf(dto, schemas);
  return { $ref: `#/components/schemas/${dto.name}` };
}

const problemSchema: JsonSchema = {
  type: 'object',
  description: 'A problem document (RFC 9457).',
  required: ['type', 'code', 'title', 'status'],
  properties: {
    type: { type: 'string' },
    code: { type: 'string' },
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    instance: { type: 'string' },
    errors: {
      type: 'array',
      items: {
        type: 'object',
        required: ['pointer', 'detail'],
        properties: { pointer: { type: 'string' }, detail: { type: 'string' } },
      },
    },
  },
};

const problemAnswer = {
  description: 'What went wrong.',
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
};
