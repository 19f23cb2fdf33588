import type { CallStep, GearNeed, ProcedureDocument, Step } from '../procedure-document';
import { calledPart, type CalledPart } from './called-part';

/** A published version of a procedure, withdrawn ones included; undefined where it is not here. */
export type ProcedureLibrary = (id: string, version: number) => ProcedureDocument | undefined;

/** The steps that a call step stands for, in the document that they were written into. */
export interface CallBlock {
  /** The call step's id; where the called procedure's findings lead to. */
  readonly call: string;
  /** Where it begins. */
  readonly first: string;
  /** The ids of its steps and findings, those of calls inside of it included. */
  readonly steps: ReadonlySet<string>;
  /** The ids of its own limits, which hold in its steps alone. */
  readonly limits: ReadonlySet<string>;
}

export interface CallProblem {
  readonly step: string;
  readonly where: string;
  readonly message: string;
}

export type Expansion =
  | { readonly ok: true; readonly document: ProcedureDocument; readonly blocks: readonly CallBlock[] }
  | { readonly ok: false; readonly problems: readonly CallProblem[] };

/** A procedure may call one that calls one; deeper, nobody knows any more where they are. */
export const deepestCall = 3;

/**
 * Writes the steps of every called procedure into the document, before the step that calls it, under names of their
 * own. A called finding leads to the call step, whose branches go on from there. Inner blocks come before outer ones.
 */
export function expandCalls(document: ProcedureDocument, library: ProcedureLibrary): Expansion {
  return expand(document, library, [document.id]);
}

function expand(document: ProcedureDocument, library: ProcedureLibrary, path: readonly string[]): Expansion {
  const problems: CallProblem[] = [];
  const parts = new Map<string, CalledPart>();
  const blocks: CallBlock[] = [];
  for (const step of document.steps) {
    if (step.kind !== 'call') continue;
    const called = calledDocument(step, library, path);
    if (!called.ok) {
      problems.push(...called.problems);
      continue;
    }
    const part = calledPart(step, called.document, called.blocks, document);
    parts.set(step.id, part);
    blocks.push(...part.blocks);
  }
  if (problems.length > 0) return { ok: false, problems };
  if (parts.size === 0) return { ok: true, document, blocks: [] };
  return { ok: true, document: withParts(document, parts), blocks };
}

function calledDocument(step: CallStep, library: ProcedureLibrary, path: readonly string[]): Expansion {
  const { id, number, procedure, version } = step;
  const refuse = (message: string): Expansion => ({
    ok: false,
    problems: [{ step: id, where: 'call', message }],
  });
  if (path.includes(procedure)) {
    return refuse(`Step ${number} calls ${procedure}, which calls this procedure again. Take one of the calls out.`);
  }
  if (path.length > deepestCall) {
    return refuse(`Step ${number} calls ${procedure} at depth ${path.length}; at most ${deepestCall} are followed.`);
  }
  const document = library(procedure, version);
  if (document === undefined) {
    return refuse(
      `Step ${number} calls ${procedure}, version ${version}, which is not here. Publish or fetch it first.`,
    );
  }
  return expand(document, library, [...path, procedure]);
}

function withParts(document: ProcedureDocument, parts: ReadonlyMap<string, CalledPart>): ProcedureDocument {
  const steps = document.steps.flatMap((step): readonly Step[] => {
    const part = parts.get(step.id);
    const own = redirected(step, parts);
    return part === undefined ? [own] : [...part.steps, { ...own, ...part.own } as Step];
  });
  const all = [...parts.values()];
  return {
    ...document,
    gear: mergedGear(document.gear, all),
    inputs: [...document.inputs, ...all.flatMap(({ inputs }) => inputs)],
    pictures: [...new Set([...document.pictures, ...all.flatMap(({ pictures }) => pictures)])],
    limits: [...document.limits, ...all.flatMap(({ limits }) => limits)],
    steps,
  };
}

/** Ways into a call step lead to where the called procedure begins. */
function redirected(step: Step, parts: ReadonlyMap<string, CalledPart>): Step {
  if (step.kind === 'finding') return step;
  const turn = <T extends { readonly to: string }>(exit: T): T => ({
    ...exit,
    to: parts.get(exit.to)?.first ?? exit.to,
  });
  return {
    ...step,
    ...(step.next === undefined
      ? {}
      : {
          next: step.next.map((branch) => ({
            ...turn(branch),
            ...(branch.thenceforth === undefined ? {} : { thenceforth: turn(branch.thenceforth) }),
          })),
        }),
    otherwise: turn(step.otherwise),
    ...('cannotMeasure' in step ? { cannotMeasure: turn(step.cannotMeasure) } : {}),
  } as Step;
}

function mergedGear(own: readonly GearNeed[], parts: readonly CalledPart[]): readonly GearNeed[] {
  const roles = new Set(own.map(({ role }) => role));
  return [...own, ...parts.flatMap(({ gear }) => gear.filter(({ role }) => !roles.has(role)))];
}
