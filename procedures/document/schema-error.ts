import type { Found, StepKind } from './procedure-document';

/** What a compiled validator says about one place (the form is ajv's). */
export interface SchemaError {
  readonly instancePath: string;
  readonly schemaPath: string;
  readonly keyword: string;
  readonly params: Readonly<Record<string, unknown>>;
  readonly message?: string;
  /** On what is wrong with a name of a table; the `propertyNames` error beside it says it of the table. */
  readonly propertyName?: string;
}

/** A compiled validator: after a refusal its `errors` say why, until it is called again. */
export interface CompiledValidator {
  (value: unknown): boolean;
  errors?: readonly SchemaError[] | null;
}

/** What a missing field would have said. */
const missingHints: Readonly<Record<string, string>> = {
  otherwise: 'say where it goes on',
  cannotMeasure: 'say where it goes on when it cannot be measured',
  because: 'say why it goes this way',
  to: 'name the step that it leads to',
  when: 'say under which condition',
  thenceforth: 'say where it goes on once the bound is reached',
  atMost: 'say how often it may be taken',
  action: 'say what to do, in one sentence',
  number: 'give the number that people say',
  kind: 'say what kind it is',
  id: 'give it an id',
  name: 'give it a name for expressions',
  unit: 'say in which unit',
  plausible: 'say which values can be believed',
  source: 'say who says so; without a published source write "common practice, no source"',
  deference: 'say whose instructions come first',
  restore: 'give the sentence that puts it back',
  stop: 'say how the car is made safe and where a stopped run goes on',
  result: 'say whether it is drawn as in band, out of band or too close to call',
  verdict: 'say what was found',
};

/** Says in a lead's words what is wrong and how to mend it; undefined for what another error says better. */
export function schemaErrorInWords(error: SchemaError): string | undefined {
  const { keyword, params, schemaPath } = error;
  const nested =
    schemaPath.includes('/anyOf/') || schemaPath.includes('/propertyNames/') || schemaPath.includes('/if/');
  if (nested || keyword === 'if') return undefined;
  switch (keyword) {
    case 'required':
    case 'dependentRequired':
      return missing(String(params['missingProperty']));
    case 'additionalProperties':
      return `\`${String(params['additionalProperty'])}\` is not known here: take it out, or look for a slip in its spelling.`;
    case 'propertyNames':
      return `\`${String(params['propertyName'])}\` cannot be a name here: use letters, digits and hyphens.`;
    case 'anyOf':
      return 'a band has at least one end: give `low`, `high` or both.';
    case 'discriminator':
      return discriminator(params);
    case 'enum':
      return `must be one of ${listed(params['allowedValues'])}.`;
    case 'const':
      return `must be ${JSON.stringify(params['allowedValue'])}.`;
    default:
      return sizeInWords(error);
  }
}

function missing(field: string): string {
  const hint = missingHints[field];
  return `\`${field}\` is missing${hint === undefined ? '' : `: ${hint}`}.`;
}

/** A missing tag is a missing field already. */
function discriminator({ tag, tagValue }: SchemaError['params']): string | undefined {
  if (tagValue === undefined) return undefined;
  const known = tag === 'kind' ? stepKinds : foundKinds;
  return `\`${String(tag)}\` is ${JSON.stringify(tagValue)}; it must be one of ${known.join(', ')}.`;
}

const stepKinds: readonly StepKind[] = [
  'start',
  'action',
  'reading',
  'choice',
  'ramp',
  'listen',
  'hold',
  'wait',
  'codes',
  'drive',
  'photo',
  'call',
  'compute',
  'restore',
  'finding',
];
const foundKinds: readonly Found['what'][] = [
  'noise-heard',
  'noise-stopped',
  'seal-point',
  'highest-gauge',
  'rise-rate',
  'manifold-gain',
  'boost-gain',
  'worst-gap',
];

function sizeInWords({ keyword, params, message }: SchemaError): string {
  const limit = String(params['limit']);
  switch (keyword) {
    case 'type':
      return `must be ${typeWords[String(params['type'])] ?? String(params['type'])}.`;
    case 'minLength':
      return 'must not be empty.';
    case 'maxLength':
      return `must not be longer than ${limit} characters.`;
    case 'minItems':
      return `must have at least ${limit}.`;
    case 'maxItems':
    case 'maxProperties':
      return `must have at most ${limit}.`;
    case 'minimum':
      return `must be ${limit} or more.`;
    case 'maximum':
      return `must be ${limit} or less.`;
    case 'exclusiveMinimum':
      return `must be above ${limit}.`;
    case 'pattern':
      return patternWords[String(params['pattern'])] ?? `must have the form ${String(params['pattern'])}.`;
    default:
      return `${message ?? keyword}.`;
  }
}

const typeWords: Readonly<Record<string, string>> = {
  object: 'a group of fields { }',
  array: 'a list [ ]',
  string: 'text in quotation marks',
  number: 'a number without quotation marks',
  integer: 'a whole number without quotation marks',
  boolean: 'true or false',
};

const patternWords: Readonly<Record<string, string>> = {
  '^[a-z][A-Za-z0-9]*$': 'must be a name: letters and digits, first letter small.',
  '^[A-Za-z][A-Za-z0-9-]*$': 'must have letters, digits and hyphens, a letter first.',
  '^[a-z0-9]+(-[a-z0-9]+)*$': 'must be lower-case words joined by hyphens.',
  '^-?[0-9]+(\\.[0-9]+)?$': 'must be a figure as text, such as "2.0".',
  '^[A-Za-z0-9]+$': 'must have letters and digits only.',
  '^[PCBU][0-3][0-9A-F]{3}$': 'must be a trouble code, such as "P0101".',
};

function listed(values: unknown): string {
  return Array.isArray(values) ? values.map((value) => JSON.stringify(value)).join(', ') : String(values);
}
