import type { GearNeed } from '../../../../procedures/document';
import type { RunView } from '../run-view';
import { cautionToRead } from '../step-cautions';

/** One screen of the start card. */
export type StartStage =
  | { readonly show: 'prerequisites' }
  | { readonly show: 'stop-actions' }
  | { readonly show: 'caution'; readonly caution: number }
  | { readonly show: 'gear'; readonly need: GearNeed; readonly place: number; readonly of: number }
  | { readonly show: 'ready' };

/** What of the start card was answered that no event keeps. */
export interface StartAnswers {
  readonly isPrepared: boolean;
  readonly knowsStopActions: boolean;
  /** Optional gear that is done without. */
  readonly without: readonly string[];
  /** The role whose gear is chosen again; empty while none is. */
  readonly again: string;
}

/** The screen that comes next: what must be ready, what to do at once, each caution, each piece of gear. */
export function startStage(run: RunView, step: Parameters<typeof cautionToRead>[1], answers: StartAnswers): StartStage {
  const { document } = run.procedure;
  const caution = cautionToRead(run, step);
  const isUnderWay = run.state.current?.acknowledged.length !== 0;
  if (!answers.isPrepared && !isUnderWay) return { show: 'prerequisites' };
  if (!answers.knowsStopActions && !isUnderWay && document.start.stopActions.length > 0) {
    return { show: 'stop-actions' };
  }
  if (caution !== undefined) return { show: 'caution', caution };
  const need = document.gear.find(
    ({ role }) => role === answers.again || (run.state.gear[role] === undefined && !answers.without.includes(role)),
  );
  if (need === undefined) return { show: 'ready' };
  return { show: 'gear', need, place: document.gear.indexOf(need) + 1, of: document.gear.length };
}
