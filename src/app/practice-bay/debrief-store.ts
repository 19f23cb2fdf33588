import { inject, Injectable, resource, signal } from '@angular/core';
import { replay, renderTemplate, type RunState } from '../../../procedures/engine/showing';
import { OfflineStore } from '../core/offline-store';
import { procedureCompiler } from '../core/procedure-compiler';
import { RunJournal } from '../core/run-journal';
import type { PublishedProcedure } from '../core/wire';
import type { PracticeScenario } from '../shared/practice/practice-scenario';
import { scenarioOfVisit } from '../shared/practice/practice-scenarios';
import { debriefRun, type Debrief } from './debrief-run';

/** A practice run with its debrief, or why there is none. */
export type DebriefedRun =
  | {
      readonly ok: true;
      readonly scenario: PracticeScenario;
      readonly published: PublishedProcedure;
      readonly state: RunState;
      readonly debrief: Debrief;
      readonly verdict: string | undefined;
    }
  | { readonly ok: false; readonly why: 'missing' | 'open' | 'unreadable' };

/** Replays a practice run of this tablet and holds it against what was planted. */
@Injectable()
export class DebriefStore {
  private readonly journal = inject(RunJournal);
  private readonly offline = inject(OfflineStore);
  private readonly compile = inject(procedureCompiler);

  private readonly runId = signal<string | undefined>(undefined);
  private readonly read = resource({ params: () => this.runId(), loader: ({ params }) => this.debrief(params) });

  readonly run = this.read.asReadonly();

  show(runId: string): void {
    this.runId.set(runId);
  }

  private async debrief(runId: string): Promise<DebriefedRun> {
    const stored = await this.journal.load(runId);
    if (stored?.header.kind !== 'practice') return { ok: false, why: 'missing' };
    const { header, events } = stored;
    const scenario = scenarioOfVisit(header.visitId);
    const published = await this.offline.procedures.get([header.procedureId, header.version]);
    if (scenario === undefined || published === undefined) return { ok: false, why: 'unreadable' };
    const procedure = await this.compile(published.document);
    const replayed = replay(procedure, header, events);
    if (!replayed.ok) return { ok: false, why: 'unreadable' };
    const { state } = replayed;
    // What was planted would be given away while the run goes on.
    if (state.status !== 'closed' && state.status !== 'signed') return { ok: false, why: 'open' };
    const finding = state.finding === undefined ? undefined : procedure.step(state.finding);
    const verdict = finding?.kind === 'finding' ? renderTemplate(procedure, state, finding.verdict) : undefined;
    const debrief = debriefRun(procedure, scenario, events, state);
    return { ok: true, scenario, published, state, debrief, verdict };
  }
}
