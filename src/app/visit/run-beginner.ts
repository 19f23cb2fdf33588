import { inject, Injectable } from '@angular/core';
import {
  openRun,
  replay,
  type BegunAgain,
  type EventDraft,
  type OpeningFacts,
  type RunEvent,
  type RunHeader,
} from '../../../procedures/engine/showing';
import type { CompiledProcedure } from '../../../procedures/document';
import { knownRuns } from '../core/known-runs';
import { OfflineStore } from '../core/offline-store';
import { CalledVersionMissing, compiledOrMissing, procedureCompiler } from '../core/procedure-compiler';
import { NobodyToSign, RunJournal } from '../core/run-journal';
import { summariseRun } from '../core/run-summary';
import { Session } from '../core/session';
import type { RunSummary } from '../core/stored-rows';
import { newId } from '../core/time-and-ids';
import { carWords } from '../core/visit-book';
import type { PublishedProcedure, Site, Visit } from '../core/wire';

/** Which half of a pair a run is. */
export type Half = 'cold' | 'warm';

/** A run that was begun, or why none was. */
export type Begun = { readonly ok: true; readonly runId: string } | { readonly ok: false; readonly message: string };

/** Begins a run of a procedure on a visit: header, first events, all on the tablet before anything is shown. */
@Injectable({ providedIn: 'root' })
export class RunBeginner {
  private readonly store = inject(OfflineStore);
  private readonly journal = inject(RunJournal);
  private readonly session = inject(Session);
  private readonly compile = inject(procedureCompiler);
  private readonly makeId = inject(newId);

  /**
   * `half` is given where the procedure is run as a pair; `again`, why, where others of the same half are known. Nothing
   * here keeps a person from beginning: what else there is may be on a tablet that is out of reach.
   */
  async begin(visit: Visit, published: PublishedProcedure, half: Half | undefined, again?: BegunAgain): Promise<Begun> {
    const person = this.session.person();
    if (!person) return { ok: false, message: 'Nobody is signed in.' };
    const site = await this.store.sites.get(visit.siteId);
    if (!site)
      return { ok: false, message: 'The site of this visit is not on the tablet yet: it comes with the next sync.' };
    const procedure = await compiledOrMissing(this.compile, published.document);
    if (procedure instanceof CalledVersionMissing) return { ok: false, message: procedure.message };
    const facts = openingFacts(visit, site, person.displayName);
    const outcome = openRun(procedure, again === undefined ? facts : { ...facts, again });
    if (!outcome.ok) return { ok: false, message: outcome.message };
    const header = await this.headerOf(visit, published, half);
    return this.write(procedure, header, outcome.drafts);
  }

  private async write(procedure: CompiledProcedure, header: RunHeader, drafts: readonly EventDraft[]): Promise<Begun> {
    try {
      await this.journal.open(header, drafts, { summarise: (events) => summaryOf(procedure, header, events) });
      return { ok: true, runId: header.runId };
    } catch (error) {
      if (error instanceof NobodyToSign) return { ok: false, message: `${error.message}.` };
      throw error;
    } finally {
      this.journal.release(header.runId);
    }
  }

  private async headerOf(visit: Visit, published: PublishedProcedure, half: Half | undefined): Promise<RunHeader> {
    const header: RunHeader = {
      runId: this.makeId(),
      procedureId: published.id,
      version: published.version,
      contentHash: published.contentHash,
      visitId: visit.id,
      siteId: visit.siteId,
      kind: 'real',
    };
    if (half === undefined) return header;
    return { ...header, half, pairId: (await this.pairIdOf(visit, published, half)) ?? this.makeId() };
  }

  /** The pair that the latest run of the other half began, unless this half of it was run already. */
  private async pairIdOf(visit: Visit, published: PublishedProcedure, half: Half): Promise<string | undefined> {
    const [own, told] = await Promise.all([
      this.store.runs.where('visitId').equals(visit.id).toArray(),
      this.store.toldRuns.where('visitId').equals(visit.id).toArray(),
    ]);
    const runs = knownRuns(own, told).filter(({ procedureId }) => procedureId === published.id);
    const taken = new Set(runs.filter((run) => run.half === half).map(({ pairId }) => pairId));
    return runs.find((run) => run.half !== half && !taken.has(run.pairId))?.pairId;
  }
}

function openingFacts(visit: Visit, site: Site, person: string): OpeningFacts {
  const { repairOrder, vin, odometer, concern, codes, car } = visit;
  return {
    visit: { repairOrder, vin, car: carWords(visit), odometer, concern, codes },
    siteName: site.name,
    person,
    elevationM: String(site.elevationM),
    ...(car.displacementL === undefined ? {} : { displacementL: car.displacementL }),
  };
}

function summaryOf(procedure: CompiledProcedure, header: RunHeader, events: readonly RunEvent[]): RunSummary {
  const replayed = replay(procedure, header, events);
  if (!replayed.ok) throw new Error(`The run does not begin: ${replayed.refusal.what}`);
  return summariseRun(procedure.document, replayed.state);
}
