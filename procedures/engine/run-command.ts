import type { UnitName } from '../calculations/for-a-run';
import type { EventDraft, InstrumentSnapshot, ReadingSource, RunEventData, TroubleCodeEntry } from './run-event';
import type { Series } from './series';

/** What a person wants to do next. `decide` turns it into events, or says why not. */
export type RunCommand =
  | { readonly do: 'acknowledge-caution'; readonly caution: number }
  | {
      readonly do: 'choose-gear';
      readonly role: string;
      readonly instrument: InstrumentSnapshot;
      readonly overdueBecause?: string;
    }
  /** The step's action is done; also goes on where everything that the step needs is there. */
  | { readonly do: 'confirm' }
  /** One take; a ramp's typed point carries its time. Goes on by itself when nothing is missing. */
  | {
      readonly do: 'record';
      readonly name: string;
      readonly text: string;
      readonly unit: UnitName;
      readonly way?: string;
      readonly source?: ReadingSource;
      readonly timeS?: number;
    }
  /** The newest take of a quantity or channel in this claim no longer counts; it stays visible. */
  | { readonly do: 'take-back'; readonly name: string; readonly reason: string }
  /** Options of a choice, or windows of a road test; goes on. */
  | { readonly do: 'choose'; readonly options: readonly string[]; readonly text?: string }
  | {
      readonly do: 'import-series';
      readonly record: Omit<RunEventData['series-recorded'], 'step' | 'name'>;
      readonly series: Series;
    }
  | {
      readonly do: 'mark';
      readonly mark: 'noise-begins' | 'noise-stops';
      readonly timeS: number;
      readonly by: 'tap' | 'pedal' | 'suggested';
    }
  | { readonly do: 'unmark'; readonly mark: 'noise-begins' | 'noise-stops' }
  /** Computes what is to be found in the series between its marks, and goes on. */
  | { readonly do: 'finish-listening'; readonly series: Series }
  /** A photo of a photo step: its bytes are a blob of their own, named by hash. `confirm` goes on. */
  | {
      readonly do: 'attach-photo';
      readonly sha256: string;
      readonly bytes: number;
      readonly mediaType: string;
    }
  /** Somebody with the role lets the run go on from a release point. */
  | {
      readonly do: 'release';
      readonly role: 'lead' | 'manager';
      readonly evidence: string;
    }
  /** A second person, by id, looked. */
  | { readonly do: 'verify'; readonly by: string }
  | { readonly do: 'record-codes'; readonly codes: readonly TroubleCodeEntry[] }
  | { readonly do: 'start-timer' }
  /** `certain` is false when the clock was changed while the app was closed. */
  | { readonly do: 'end-timer'; readonly certain: boolean }
  | { readonly do: 'restore'; readonly item: string }
  | { readonly do: 'cannot-measure'; readonly reason: string }
  /** The step does not apply to this car; says why. */
  | { readonly do: 'not-applicable'; readonly reason: string }
  | { readonly do: 'not-sure'; readonly question: string }
  | { readonly do: 'set-aside'; readonly reason: string }
  | { readonly do: 'resume' }
  | { readonly do: 'stop'; readonly reason: string }
  /** Why it was stopped: needed to end as not completed, unless it was said when stopping. */
  | { readonly do: 'leave-stop'; readonly how: 'go-back' | 'not-completed'; readonly reason?: string }
  | { readonly do: 'acknowledge-limit' }
  | { readonly do: 'note'; readonly text: string; readonly isMargin?: boolean }
  /** Takes another authored exit of the step before, by the exit's name; what that step recorded stays. */
  | { readonly do: 'overrule'; readonly exit: string; readonly reason: string }
  | { readonly do: 'redo'; readonly step: string; readonly reason: string }
  | {
      readonly do: 'keep-write-up';
      readonly concern: string;
      readonly cause: string;
      readonly correction: string;
      readonly customer: string;
    }
  | { readonly do: 'close' };

/** What a command gives: events to be written, or a reason in words that say how to go on. */
export type Outcome =
  | { readonly ok: true; readonly drafts: readonly EventDraft[] }
  | {
      readonly ok: false;
      readonly code: string;
      readonly message: string;
      readonly field?: string;
      /** The step that has to be taken again first: its reading no longer holds. */
      readonly takeAgain?: string;
    };
