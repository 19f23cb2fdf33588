import type {
  Band,
  Channel,
  EntryWay,
  Found,
  Quantity,
  ReadQuantity,
  Result,
  Sentence,
  Step,
  TakenResult,
} from '../procedure-document';
import type { Renaming } from './prefixed-names';
import { renamedBranch, renamedExit } from './renamed-exit';

type Roles = (role: string) => string;

/** A step with every id, name, role, expression and template of it changed. Nothing that is read by people changes. */
export function renamedStep(step: Step, renaming: Renaming, roles: Roles): Step {
  const head = {
    ...step,
    id: renaming.step(step.id),
    ...(step.why === undefined ? {} : { why: renaming.template(step.why) }),
  };
  return { ...head, ...waysOn(step, renaming), ...content(step, renaming, roles) } as Step;
}

function waysOn(step: Step, renaming: Renaming): object {
  if (step.kind === 'finding') return {};
  return {
    ...(step.next === undefined ? {} : { next: step.next.map((branch) => renamedBranch(branch, renaming)) }),
    otherwise: renamedExit(step.otherwise, renaming),
    ...('cannotMeasure' in step ? { cannotMeasure: renamedExit(step.cannotMeasure, renaming) } : {}),
    ...(step.results === undefined ? {} : { results: step.results.map((result) => renamedResult(result, renaming)) }),
  };
}

/** What the kind brings with it. */
function content(step: Step, renaming: Renaming, roles: Roles): object {
  const { name, expression } = renaming;
  const reads = (given: readonly ReadQuantity[]): readonly ReadQuantity[] =>
    given.map((read) => renamedRead(read, renaming, roles));
  switch (step.kind) {
    case 'reading':
      return { reads: reads(step.reads) };
    case 'wait':
      return { reads: reads(step.reads), until: expression(step.until) };
    case 'hold':
      return {
        ...(step.heldAs === undefined ? {} : { heldAs: name(step.heldAs) }),
        ...(step.begins === undefined ? {} : { begins: reads(step.begins) }),
        ...(step.ends === undefined ? {} : { ends: reads(step.ends) }),
      };
    case 'choice':
      return { name: name(step.name), options: step.options.map((option) => ({ ...option, name: name(option.name) })) };
    case 'drive':
      return { name: name(step.name), windows: step.windows.map((window) => ({ ...window, name: name(window.name) })) };
    case 'photo':
      return { name: name(step.name) };
    case 'codes':
      return {
        name: name(step.name),
        ...(step.comparedWith === undefined ? {} : { comparedWith: name(step.comparedWith) }),
        ...(step.newCodes === undefined ? {} : { newCodes: name(step.newCodes) }),
      };
    case 'ramp':
    case 'listen':
      return {
        name: name(step.name),
        channels: step.channels.map((channel): Channel => withRole(channel, roles)),
        finds: step.finds.map((found) => renamedFound(found, renaming)),
      };
    case 'call':
      return {
        takes: step.takes.map((taken): TakenResult => ({
          ...renamedQuantity(taken, renaming),
          from: name(taken.from),
        })),
        finds: step.finds.map((found) => ({ finding: renaming.step(found.finding), name: name(found.name) })),
      };
    case 'finding':
      return {
        verdict: renaming.template(step.verdict),
        cause: sentences(step.cause, renaming),
        correction: sentences(step.correction, renaming),
        customer: sentences(step.customer, renaming),
      };
    default:
      return {};
  }
}

function renamedFound(found: Found, renaming: Renaming): Found {
  return 'unit' in found ? renamedQuantity(found, renaming) : { ...found, name: renaming.name(found.name) };
}

function renamedQuantity<T extends Quantity>(quantity: T, renaming: Renaming): T {
  return {
    ...quantity,
    name: renaming.name(quantity.name),
    ...(quantity.band === undefined ? {} : { band: renamedBand(quantity.band, renaming) }),
  };
}

function renamedResult(result: Result, renaming: Renaming): Result {
  return { ...renamedQuantity(result, renaming), is: renaming.expression(result.is) };
}

function renamedBand(band: Band, { expression }: Renaming): Band {
  return {
    ...band,
    ...(band.low === undefined ? {} : { low: expression(band.low) }),
    ...(band.high === undefined ? {} : { high: expression(band.high) }),
    ...(band.when === undefined ? {} : { when: expression(band.when) }),
  };
}

function renamedRead(read: ReadQuantity, renaming: Renaming, roles: Roles): ReadQuantity {
  return {
    ...withRole(renamedQuantity(read, renaming), roles),
    ...(read.ways === undefined ? {} : { ways: read.ways.map((way) => renamedWay(way, renaming, roles)) }),
    ...(read.validity === undefined
      ? {}
      : {
          validity: { ...read.validity, ...(read.validity.until && { until: read.validity.until.map(renaming.step) }) },
        }),
  };
}

function renamedWay(way: EntryWay, { name, expression }: Renaming, roles: Roles): EntryWay {
  return {
    ...way,
    is: expression(way.is),
    ...(way.uncertainty === undefined ? {} : { uncertainty: expression(way.uncertainty) }),
    ...(way.entry === undefined ? {} : { entry: { ...withRole(way.entry, roles), name: name(way.entry.name) } }),
  };
}

function withRole<T extends { readonly gear?: string }>(part: T, roles: Roles): T {
  return part.gear === undefined ? part : { ...part, gear: roles(part.gear) };
}

function sentences(given: readonly Sentence[], { template, expression }: Renaming): readonly Sentence[] {
  return given.map(({ text, when }) => ({
    text: template(text),
    ...(when === undefined ? {} : { when: expression(when) }),
  }));
}
