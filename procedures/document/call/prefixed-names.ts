import { declarationsOf } from '../declarations';
import { tokenise } from '../expression/tokenise';
import type { CallStep, ProcedureDocument, ProcedureInput } from '../procedure-document';
import { valueNamesOf } from '../lint/named-values';

/** What the ids, names and roles of a called procedure become beside those of the one that calls it. */
export interface Renaming {
  readonly step: (id: string) => string;
  readonly name: (name: string) => string;
  /** An expression's text with its names changed; as it was where it cannot be read. */
  readonly expression: (source: string) => string;
  /** A template with its names changed. */
  readonly template: (text: string) => string;
}

/** The air of the place and the half are the same in every part of a run; channels are the words of series. */
const common: readonly string[] = ['stationPressure', 'cold', 'warm', 'gauge', 'manifold', 'boost', 'sound'];

/** `intake-hold` and `leakRate` give `intakeHoldLeakRate`. */
export function prefixed(call: string, name: string): string {
  const words = call.split('-').filter((word) => word !== '');
  const first = words.map((word, index) => (index === 0 ? lowerFirst(word) : upperFirst(word))).join('');
  return `${first}${upperFirst(name)}`;
}

export function renamingFor(call: CallStep, called: ProcedureDocument, caller: ProcedureDocument): Renaming {
  const findings = new Set(called.steps.flatMap((step) => (step.kind === 'finding' ? [step.id] : [])));
  const shared = new Set([...common, ...called.inputs.filter((input) => isShared(input, caller)).map(nameOf)]);
  const names = new Map(
    [...declarationsOf(called).declarations.keys(), ...called.steps.flatMap(valueNamesOf)]
      .filter((name) => !shared.has(name))
      .map((name) => [name, prefixed(call.id, name)]),
  );
  const steps = new Map(
    called.steps.map(({ id }) => [id, findings.has(id) ? prefixed(call.id, id) : `${call.id}-${id}`]),
  );
  const name = (given: string): string => names.get(given) ?? given;
  return {
    name,
    step: (id) => steps.get(id) ?? id,
    expression: (source) => renamedExpression(source, name),
    template: (text) =>
      text.replaceAll(/\{([^{}]*)\}/g, (_, inside: string) => `{${names.get(inside) ?? steps.get(inside) ?? inside}}`),
  };
}

/** What comes from the site or the visit is the same figure in both. */
function isShared(input: ProcedureInput, caller: ProcedureDocument): boolean {
  if (input.from === 'default') return false;
  return caller.inputs.some(
    ({ name, from, unit }) => name === input.name && from === input.from && unit === input.unit,
  );
}

const nameOf = ({ name }: ProcedureInput): string => name;

/** A name before a bracket is a function's. */
function renamedExpression(source: string, rename: (name: string) => string): string {
  const read = tokenise(source);
  if (!read.ok) return source;
  let text = '';
  let from = 0;
  read.tokens.forEach((token, index) => {
    const next = read.tokens[index + 1];
    const isCall = next?.token === 'sign' && next.sign === '(';
    if (token.token !== 'name' || isCall) return;
    text += source.slice(from, token.start) + rename(token.name);
    from = token.end;
  });
  return text + source.slice(from);
}

const lowerFirst = (word: string): string => word.charAt(0).toLowerCase() + word.slice(1);
const upperFirst = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1);
