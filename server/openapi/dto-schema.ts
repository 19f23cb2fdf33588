import { getMetadataStorage } from 'class-validator';
import { nestedDto, type Dto } from '../http/validated';

/** The part of JSON Schema (2020-12) that DTOs need. */
export interface JsonSchema {
  readonly $ref?: string;
  readonly type?: string;
  readonly description?: string;
  readonly format?: string;
  readonly pattern?: string;
  readonly enum?: readonly unknown[];
  readonly minimum?: number;
  readonly maximum?: number;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly minItems?: number;
  readonly maxItems?: number;
  readonly items?: JsonSchema;
  readonly required?: readonly string[];
  readonly properties?: Readonly<Record<string, JsonSchema>>;
  readonly additionalProperties?: boolean;
}

interface Rule {
  readonly propertyName: string;
  readonly name?: string;
  readonly type: string;
  readonly each: boolean;
  readonly constraints?: readonly unknown[];
}

/** The schema of a DTO from its validators; nested DTOs are put into `schemas` and referred to. */
export function schemaOf(dto: Dto<object>, schemas: Record<string, JsonSchema>): JsonSchema {
  const rules = getMetadataStorage().getTargetValidationMetadatas(dto, '', false, false) as unknown as readonly Rule[];
  const names = [...new Set(rules.map(({ propertyName }) => propertyName))];
  const properties = names.map((name) => {
    const own = rules.filter(({ propertyName }) => propertyName === name);
    return [name, propertySchema(dto, name, own, schemas)] as const;
  });
  const optional = new Set(rules.filter(({ name }) => name === 'isOptional').map(({ propertyName }) => propertyName));
  return {
    type: 'object',
    additionalProperties: false,
    required: names.filter((name) => !optional.has(name)),
    properties: Object.fromEntries(properties),
  };
}

function propertySchema(
  dto: Dto<object>,
  property: string,
  rules: readonly Rule[],
  schemas: Record<string, JsonSchema>,
): JsonSchema {
  const nested = nestedDto(dto, property);
  const isList = rules.some(({ each, name }) => each || name === 'isArray');
  const item: JsonSchema = nested === undefined ? merged(rules.filter(({ each }) => each)) : reference(nested, schemas);
  if (isList) return { ...merged(rules.filter(({ each }) => !each)), type: 'array', items: item };
  return nested === undefined ? merged(rules) : item;
}

function reference(dto: Dto<object>, schemas: Record<string, JsonSchema>): JsonSchema {
  schemas[dto.name] ??= schemaOf(dto, schemas);
  return { $ref: `#/components/schemas/${dto.name}` };
}

function merged(rules: readonly Rule[]): JsonSchema {
  return rules.reduce<JsonSchema>((schema, rule) => ({ ...schema, ...keywordOf(rule) }), {});
}

/** Validator -> keyword, with its first constraint. */
function keywordOf({ name, constraints = [] }: Rule): JsonSchema {
  const [first] = constraints;
  switch (name) {
    case 'isString':
      return { type: 'string' };
    case 'isBoolean':
      return { type: 'boolean' };
    case 'isInt':
      return { type: 'integer' };
    case 'isObject':
      return { type: 'object' };
    case 'isUuid':
      return { type: 'string', format: 'uuid' };
    case 'isIso8601':
      return { type: 'string', format: 'date-time' };
    case 'isIn':
      return { enum: first as readonly unknown[] };
    case 'matches':
      return { type: 'string', pattern: (first as RegExp).source };
    case 'min':
      return { minimum: first as number };
    case 'max':
      return { maximum: first as number };
    case 'minLength':
      return { type: 'string', minLength: first as number };
    case 'maxLength':
      return { type: 'string', maxLength: first as number };
    case 'arrayMaxSize':
      return { maxItems: first as number };
    default:
      return {};
  }
}
