import type { Exit, ProcedureDocument, Step } from '../procedure-document';

/** A way that a document gives out of a step. */
export interface Way {
  readonly kind: 'branch' | 'thenceforth' | 'otherwise' | 'cannot-measure' | 'stop';
  /** The branch's place in `next`; for a thenceforth that of its branch. */
  readonly branch?: number;
  readonly exit: Exit;
  /** The condition's text, for a branch and its thenceforth. */
  readonly when?: string;
  /** Whether one run can take it only so often. */
  readonly isBounded: boolean;
  /** JSON pointer to the exit. */
  readonly pointer: string;
}

/** Every authored way out of a step, in the order in which they are tried; the step's place is its index. */
export function waysOf(document: ProcedureDocument, place: number): readonly Way[] {
  const step = document.steps[place];
  if (step === undefined || step.kind === 'finding') return [];
  const pointer = `/steps/${place}`;
  const branches = (step.next ?? []).flatMap((branch, index): Way[] => {
    const at = `${pointer}/next/${index}`;
    const { when, thenceforth, atMost } = branch;
    const taken: Way = {
      kind: 'branch',
      branch: index,
      exit: branch,
      when,
      isBounded: atMost !== undefined,
      pointer: at,
    };
    if (thenceforth === undefined) return [taken];
    const after: Way = {
      kind: 'thenceforth',
      branch: index,
      exit: thenceforth,
      when,
      isBounded: false,
      pointer: `${at}/thenceforth`,
    };
    return [taken, after];
  });
  return [
    ...branches,
    { kind: 'otherwise', exit: step.otherwise, isBounded: false, pointer: `${pointer}/otherwise` },
    ...(hasHonestWay(step)
      ? [
          {
            kind: 'cannot-measure',
            exit: step.cannotMeasure,
            isBounded: false,
            pointer: `${pointer}/cannotMeasure`,
          } as const,
        ]
      : []),
    { kind: 'stop', exit: document.stop.exit, isBounded: false, pointer: '/stop/exit' },
  ];
}

function hasHonestWay(step: Step): step is Extract<Step, { cannotMeasure: Exit }> {
  return 'cannotMeasure' in step;
}

/** `branch 2`, `otherwise`, `stop`: for messages. */
export function wayName({ kind, branch }: Way): string {
  switch (kind) {
    case 'branch':
      return `branch ${(branch ?? 0) + 1}`;
    case 'thenceforth':
      return `branch ${(branch ?? 0) + 1}, thenceforth`;
    case 'otherwise':
      return 'otherwise';
    case 'cannot-measure':
      return 'cannot measure';
    case 'stop':
      return 'stop';
  }
}
