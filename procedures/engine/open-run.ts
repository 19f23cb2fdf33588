import type { CompiledProcedure } from '../document';
import { parseDecimal } from './figures';
import type { Outcome } from './run-command';
import type { BegunAgain, Figure, VisitSnapshot } from './run-event';

/** What a run starts with, as site and visit know it. */
export interface OpeningFacts {
  readonly visit: VisitSnapshot;
  readonly siteName: string;
  readonly person: string;
  /** Metres, decimal text; absent where the site has none. */
  readonly elevationM?: string;
  /** Litres, decimal text. */
  readonly displacementL?: string;
  /** Why it is begun although others of the same half are known. */
  readonly again?: BegunAgain;
}

/** The first two events of a run: opened, with every input resolved, and the claim of the first step. */
export function openRun(procedure: CompiledProcedure, facts: OpeningFacts): Outcome {
  const { document } = procedure;
  const inputs: Record<string, Figure & { readonly source: string }> = {};
  for (const input of document.inputs) {
    const field = { 'site.elevation': facts.elevationM, 'visit.displacement': facts.displacementL, default: undefined }[
      input.from
    ];
    const text = field ?? input.default;
    if (text === undefined || parseDecimal(text) === undefined) {
      return {
        ok: false,
        code: 'input',
        message: `The procedure needs ${input.label.toLowerCase()}. Enter it with the site or the visit first.`,
        field: input.name,
      };
    }
    inputs[input.name] = {
      text,
      unit: input.unit,
      ...(input.sense === undefined ? {} : { sense: input.sense }),
      source: field === undefined ? input.source : input.from === 'site.elevation' ? 'the site' : 'the visit',
    };
  }
  const first = document.steps[0];
  if (first === undefined) return { ok: false, code: 'no-steps', message: 'The procedure has no steps.' };
  const { visit, siteName, person, again } = facts;
  return {
    ok: true,
    drafts: [
      { type: 'opened', data: { visit, siteName, inputs, person, ...(again === undefined ? {} : { again }) } },
      { type: 'step-claimed', data: { step: first.id } },
    ],
  };
}
