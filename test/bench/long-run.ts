import { compileProcedure, type CompiledProcedure } from '../../procedures/document';
import { longProcedure } from '../../procedures/document/testing/long-procedure';
import type { RunEvent, RunHeader } from '../../procedures/engine';
import { RunWalk } from '../../procedures/engine/testing/run-walk';
import { gaugeG12, scanToolS3 } from '../support/ossenholt-gear';

export interface LongRun {
  readonly procedure: CompiledProcedure;
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
}

/** Its range begins at the procedure's own. */
const scanTool = { ...scanToolS3, shows: scanToolS3.shows.map((range) => ({ ...range, low: Math.min(0, range.low) })) };

/** A run of at least so many events in an invented procedure: its readings are walked in order, and again from the first. */
export function longRun(readings: number, events: number): LongRun {
  const compiled = compileProcedure(longProcedure(readings, 8));
  if (!compiled.ok) throw new Error(compiled.problems.map(({ message }) => message).join('\n'));
  const walk = new RunWalk(compiled.procedure);
  walk
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gaugeG12 },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
    );
  for (let reading = 0; walk.events.length < events; reading += 1) {
    if (reading > 0 && reading % (readings - 1) === 0) walk.do({ do: 'redo', step: 'read0', reason: 'once more' });
    const name = walk.state.current?.id.replace('read', 'pressure') ?? '';
    walk.do({ do: 'record', name, text: (5 + (reading % 7) / 10).toFixed(1), unit: 'kPa' });
  }
  // As they come from storage or over the wire.
  const stored = JSON.parse(JSON.stringify(walk.events.slice(0, events))) as RunEvent[];
  return { procedure: compiled.procedure, header: walk.header, events: stored };
}
