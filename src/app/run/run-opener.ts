import { inject, Injectable } from '@angular/core';
import type { CompiledProcedure } from '../../../procedures/document';
import { replay, waitsForSomebody, type RunState } from '../../../procedures/engine/showing';
import { OfflineStore } from '../core/offline-store';
import { RunJournal } from '../core/run-journal';
import { Session } from '../core/session';
import { CalledVersionMissing, compiledOrMissing, procedureCompiler } from '../core/procedure-compiler';
import type { RunView } from './run-view';

/** A run as it was found on this tablet, or why it cannot be shown. */
export type OpenedRun =
  | {
      readonly ok: true;
      readonly view: RunView;
      /** Whether another window writes it: then it is shown, and nothing can be entered. */
      readonly isElsewhere: boolean;
      /** By how much the device's clock stood before the last event's, milliseconds. */
      readonly clockBackMs: number;
    }
  | { readonly ok: false; readonly why: 'missing' | 'not-allowed' | 'no-procedure' | 'damaged'; readonly what: string };

/** Takes a run from the store, with the very version of the procedure that it was begun under, and replays it. */
@Injectable({ providedIn: 'root' })
export class RunOpener {
  private readonly journal = inject(RunJournal);
  private readonly store = inject(OfflineStore);
  private readonly compile = inject(procedureCompiler);
  private readonly session = inject(Session);

  async open(runId: string): Promise<OpenedRun> {
    const isHeld = await this.journal.hold(runId);
    const stored = await this.journal.load(runId);
    if (stored === undefined) return { ok: false, why: 'missing', what: runId };
    const { header, events, clockBackMs } = stored;
    const role = this.session.person()?.role;
    // What the server would refuse from this person must not be written on the tablet either.
    const mayOpen = role === 'technician' || role === 'lead' || role === 'manager';
    if (header.kind === 'real' && !mayOpen) {
      this.journal.release(runId);
      return { ok: false, why: 'not-allowed', what: role ?? '' };
    }
    const published = await this.store.procedures.get([header.procedureId, header.version]);
    if (published === undefined) {
      return { ok: false, why: 'no-procedure', what: `${header.procedureId}, version ${header.version}` };
    }
    const procedure = await compiledOrMissing(this.compile, published.document);
    if (procedure instanceof CalledVersionMissing) {
      const { procedure: id, version } = procedure.called;
      return { ok: false, why: 'no-procedure', what: `${id}, version ${version}, which is called in it` };
    }
    const replayed = replay(procedure, header, events);
    if (!replayed.ok) {
      return { ok: false, why: 'damaged', what: `event ${replayed.refusal.seq}: ${replayed.refusal.what}` };
    }
    if (header.kind === 'real' && role === 'manager' && !waitsForRelease(procedure, replayed.state)) {
      this.journal.release(runId);
      return { ok: false, why: 'not-allowed', what: role };
    }
    return {
      ok: true,
      view: { procedure, header, events, state: replayed.state },
      isElsewhere: !isHeld,
      clockBackMs,
    };
  }

  close(runId: string): void {
    this.journal.release(runId);
  }
}

/** A manager reads finished runs in the Record room; only a release brings them to an open one. */
function waitsForRelease(procedure: CompiledProcedure, { current }: RunState): boolean {
  const step = current === undefined ? undefined : procedure.step(current.id);
  return step !== undefined && waitsForSomebody(step, current) === 'release';
}
