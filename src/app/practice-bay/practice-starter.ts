import { inject, Injectable } from '@angular/core';
import { openRun, replay, type RunEvent, type RunHeader } from '../../../procedures/engine/showing';
import { CalledVersionMissing, compiledOrMissing, procedureCompiler } from '../core/procedure-compiler';
import { RunJournal } from '../core/run-journal';
import { summariseRun } from '../core/run-summary';
import { Session } from '../core/session';
import { newId } from '../core/time-and-ids';
import type { PublishedProcedure } from '../core/wire';
import type { PracticeScenario } from '../shared/practice/practice-scenario';

/** How a start ended: the new run's id, or why there is none. */
export type StartedPractice =
  { readonly ok: true; readonly runId: string } | { readonly ok: false; readonly why: string };

/** Opens a run of kind practice on a scenario's car. It is kept in the practice store and is never sent. */
@Injectable({ providedIn: 'root' })
export class PracticeStarter {
  private readonly journal = inject(RunJournal);
  private readonly compile = inject(procedureCompiler);
  private readonly session = inject(Session);
  private readonly makeId = inject(newId);

  async start(scenario: PracticeScenario, published: PublishedProcedure): Promise<StartedPractice> {
    const person = this.session.person();
    if (person === undefined) return { ok: false, why: 'Nobody is signed in.' };
    const procedure = await compiledOrMissing(this.compile, published.document);
    if (procedure instanceof CalledVersionMissing) return { ok: false, why: procedure.message };
    const opening = openRun(procedure, {
      visit: scenario.visit,
      siteName: scenario.place.name,
      person: person.displayName,
      elevationM: scenario.place.elevationM,
      displacementL: scenario.displacementL,
    });
    if (!opening.ok) return { ok: false, why: opening.message };
    const header: RunHeader = {
      runId: this.makeId(),
      procedureId: published.id,
      version: published.version,
      contentHash: published.contentHash,
      visitId: scenario.visitId,
      siteId: person.siteId,
      kind: 'practice',
      half: scenario.half,
    };
    const summarise = (events: readonly RunEvent[]) => {
      const opened = replay(procedure, header, events);
      if (!opened.ok) throw new RangeError(`The opening does not fit: ${opened.refusal.what}`);
      return summariseRun(published.document, opened.state);
    };
    try {
      await this.journal.open(header, opening.drafts, { summarise });
    } finally {
      this.journal.release(header.runId);
    }
    return { ok: true, runId: header.runId };
  }
}
