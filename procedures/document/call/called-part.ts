import type {
  ActionStep,
  CallStep,
  GearNeed,
  Limit,
  ProcedureDocument,
  ProcedureInput,
  Step,
} from '../procedure-document';
import type { CallBlock } from './expand-calls';
import { prefixed, renamingFor, type Renaming } from './prefixed-names';
import { renamedStep } from './renamed-step';

/** What a call step brings into the document that it stands in. */
export interface CalledPart {
  readonly first: string;
  readonly steps: readonly Step[];
  /** The call step's own fields under the new names. */
  readonly own: Pick<CallStep, 'takes' | 'finds'>;
  readonly gear: readonly GearNeed[];
  readonly inputs: readonly ProcedureInput[];
  readonly pictures: readonly string[];
  readonly limits: readonly Limit[];
  readonly blocks: readonly CallBlock[];
}

/** The called document has no call steps left; `inner` are the blocks that came of those. */
export function calledPart(
  call: CallStep,
  called: ProcedureDocument,
  inner: readonly CallBlock[],
  caller: ProcedureDocument,
): CalledPart {
  const renaming = renamingFor(call, called, caller);
  const roles = rolesOf(call, called, caller);
  const limit = (id: string): string => `${call.id}-${id}`;
  const steps = called.steps.map((step) => renamedStep(begun(step, called, call), renaming, roles));
  const first = renaming.step(called.steps[0]?.id ?? '');
  const limits = called.limits.map((given) => ({ ...given, id: limit(given.id), of: given.of.map(renaming.name) }));
  const innerLimits = new Set(inner.flatMap((block) => [...block.limits]));
  return {
    first,
    steps: steps.map((step) => numbered(step, call)),
    own: {
      takes: call.takes.map((taken) => ({ ...taken, from: renaming.name(taken.from) })),
      finds: call.finds.map((found) => ({ ...found, finding: renaming.step(found.finding) })),
    },
    gear: called.gear.map((need) => ({ ...need, role: roles(need.role) })),
    inputs: called.inputs
      .filter(({ name }) => renaming.name(name) !== name || !caller.inputs.some((input) => input.name === name))
      .map((input) => ({ ...input, name: renaming.name(input.name) })),
    pictures: called.pictures,
    limits,
    blocks: [
      ...inner.map((block) => renamedBlock(block, renaming, limit)),
      {
        call: call.id,
        first,
        steps: new Set(steps.map(({ id }) => id)),
        limits: new Set(called.limits.filter(({ id }) => !innerLimits.has(id)).map(({ id }) => limit(id))),
      },
    ],
  };
}

function renamedBlock(block: CallBlock, renaming: Renaming, limit: (id: string) => string): CallBlock {
  return {
    call: renaming.step(block.call),
    first: renaming.step(block.first),
    steps: new Set([...block.steps].map(renaming.step)),
    limits: new Set([...block.limits].map(limit)),
  };
}

/** Inside of a run there is no second start card: its cautions stand before a step that makes ready. */
function begun(step: Step, called: ProcedureDocument, call: CallStep): Step {
  if (step.kind !== 'start') return step;
  const { throughout, prerequisites } = called.start;
  const begin: ActionStep = {
    ...step,
    kind: 'action',
    title: called.title,
    action: call.action,
    cautions: [...throughout, ...(step.cautions ?? [])],
    notes: [...(step.notes ?? []), ...prerequisites],
  };
  return begin;
}

/** Step 3 of what step 9 calls is step 9.3. */
function numbered(step: Step, call: CallStep): Step {
  return { ...step, number: `${call.number}.${step.number}` };
}

/** The same instrument serves both where it is the same need; otherwise the called one has a role of its own. */
function rolesOf(call: CallStep, called: ProcedureDocument, caller: ProcedureDocument): (role: string) => string {
  const own = new Map(
    called.gear
      .filter((need) => !caller.gear.some((other) => isSameNeed(need, other)))
      .map(({ role }) => [role, prefixed(call.id, role)]),
  );
  return (role) => own.get(role) ?? role;
}

function isSameNeed(a: GearNeed, b: GearNeed): boolean {
  const isOptional = (need: GearNeed): boolean => need.optional === true;
  return (
    a.role === b.role &&
    a.kind === b.kind &&
    isOptional(a) === isOptional(b) &&
    a.shows?.unit === b.shows?.unit &&
    a.shows?.low === b.shows?.low &&
    a.shows?.high === b.shows?.high &&
    a.shows?.resolution === b.shows?.resolution
  );
}
