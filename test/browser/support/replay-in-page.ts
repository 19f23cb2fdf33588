import { compileProcedure } from '../../../procedures/document';
import {
  applyEvent,
  canonicalJson,
  sha256Hex,
  type RunEvent,
  type RunHeader,
  type RunState,
} from '../../../procedures/engine';
import { crankcaseValveSeal } from '../../../procedures/library';

/** A run as it is stored. */
export interface StoredRun {
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
}

/** What an engine made of a run. */
export interface ReplayedRun {
  /** SHA-256 of the canonical text of the state after each event. */
  readonly states: readonly string[];
  /** The canonical text of the last one; a refusal in words where there is none. */
  readonly last: string;
}

/** Replays stored runs, given and answered as text, wherever this is loaded. */
export function replayStored(text: string): string {
  const compiled = compileProcedure(crankcaseValveSeal);
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
  const { procedure } = compiled;
  const runs = JSON.parse(text) as readonly StoredRun[];
  return JSON.stringify(
    runs.map(({ header, events }): ReplayedRun => {
      let state: RunState | undefined;
      const states: string[] = [];
      for (const event of events) {
        const result = applyEvent(procedure, header, state, event);
        if (!result.ok) return { states, last: `refused: ${result.refusal.what}` };
        state = result.state;
        states.push(sha256Hex(canonicalJson(state)));
      }
      return { states, last: canonicalJson(state) };
    }),
  );
}
