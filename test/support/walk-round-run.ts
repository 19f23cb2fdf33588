import { v7 as uuidv7 } from 'uuid';
import { compileProcedure, type CompiledProcedure } from '../../procedures/document';
import { plugHold } from '../../procedures/document/testing/plug-hold';
import { walkRound } from '../../procedures/document/testing/walk-round';
import { RunWalk } from '../../procedures/engine/testing/run-walk';
import { demoSites } from '../../server/database/demo/demo-garage';
import { gaugeG12 } from './ossenholt-gear';
import { sent, type SentRun, type Writer } from './test-run';

/** The walk-round with the plug hold test written in. */
export function compiledWalkRound(): CompiledProcedure {
  const compiled = compileProcedure(walkRound, (id) => (id === plugHold.id ? plugHold : undefined));
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
  return compiled.procedure;
}

/** A walk-round through the called test, up to the step that is released: the plug stood at the given pressure. */
export function walkedThroughCall(plugKpa: string): RunWalk {
  const header = { runId: uuidv7(), visitId: uuidv7(), siteId: demoSites[0]?.id ?? '' };
  const { half: _noHalf, ...whole } = new RunWalk(compiledWalkRound(), header).header;
  const walk = new RunWalk(compiledWalkRound(), whole);
  return walk
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gaugeG12 },
      { do: 'confirm' },
      { do: 'record', name: 'coolantTemperature', text: '88', unit: 'degC' },
      { do: 'confirm' },
    )
    .cautions(1)
    .do(
      { do: 'confirm' },
      { do: 'confirm' },
      { do: 'record', name: 'plugTestPlugPressure', text: plugKpa, unit: 'kPa' },
      { do: 'restore', item: 'vent' },
    )
    .do({ do: 'confirm' });
}

/** The same as a tablet sends it. */
export function sentThroughCall(plugKpa: string, writer: Writer): SentRun {
  return sent(walkedThroughCall(plugKpa), writer);
}
