import 'reflect-metadata';
import { plainToInstance, Type } from 'class-transformer';
import { IsArray, IsDefined, ValidateNested, validateSync, type ValidationError } from 'class-validator';
import { BadRequest, Invalid, InvalidQuery, type FieldProblem } from './problem';

/** A DTO's class. */
export type Dto<T extends object> = new () => T;

/** What was sent as a checked instance of `dto`; unknown fields are refused. This file alone calls class-transformer. */
export function validated<T extends object>(dto: Dto<T>, source: unknown): T {
  const { instance, errors } = check(dto, source);
  if (errors.length > 0) throw new Invalid('Some fields are not valid.', errors);
  return instance;
}

/** The same for a query string, whose failures are the address's and not the content's. */
export function validatedQuery<T extends object>(dto: Dto<T>, source: unknown): T {
  const { instance, errors } = check(dto, { ...(source as object) });
  if (errors.length > 0) throw new InvalidQuery('Some parts of the query are not valid.', errors);
  return instance;
}

const nestedClasses = new Map<object, Map<string | symbol, () => Dto<object>>>();

/** A field (or, with `each`, every item of a list) that is checked by a DTO of its own. */
export function Nested(dto: () => Dto<object>, options: { readonly each?: boolean } = {}): PropertyDecorator {
  return (target, property) => {
    Type(dto)(target, property);
    // Alone, ValidateNested lets what is missing pass.
    IsDefined()(target, property);
    if (options.each) IsArray()(target, property);
    ValidateNested({ each: options.each ?? false })(target, property);
    const ofClass = nestedClasses.get(target.constructor) ?? new Map<string | symbol, () => Dto<object>>();
    nestedClasses.set(target.constructor, ofClass.set(property, dto));
  };
}

/** The class that `Nested` gave a field. */
export function nestedDto(dto: Dto<object>, property: string): Dto<object> | undefined {
  return nestedClasses.get(dto)?.get(property)?.();
}

function check<T extends object>(dto: Dto<T>, source: unknown): { instance: T; errors: readonly FieldProblem[] } {
  // plainToInstance(dto, null) and arrays make the validator throw or refuse without words.
  if (typeof source !== 'object' || source === null || Array.isArray(source)) {
    throw new BadRequest('A JSON object is expected.');
  }
  const instance = plainToInstance(dto, source);
  const errors = validateSync(instance, {
    whitelist: true,
    forbidNonWhitelisted: true,
    forbidUnknownValues: true,
    validationError: { target: false, value: false },
  });
  return { instance, errors: errors.flatMap((error) => fieldProblems(error, '')) };
}

function fieldProblems(error: ValidationError, above: string): readonly FieldProblem[] {
  const pointer = `${above}/${error.property.replaceAll('~', '~0').replaceAll('/', '~1')}`;
  const own = Object.values(error.constraints ?? {}).map((detail) => ({ pointer, detail }));
  return [...own, ...(error.children ?? []).flatMap((child) => fieldProblems(child, pointer))];
}
