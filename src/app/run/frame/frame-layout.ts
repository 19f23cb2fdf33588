import type { Step } from '../../../../procedures/document';

/** What a step needs room for where room is scarce; empty where the number pad does. */
export type FrameLayout = 'starts' | 'listens' | 'tells' | 'looks' | 'compares' | 'pictures' | '';

/** How the run's frame shares its room between the wide side and the hand at a step. */
export function frameLayout(step: Step | undefined): FrameLayout {
  switch (step?.kind) {
    case undefined:
      return '';
    case 'start':
      return 'starts';
    case 'listen':
    case 'ramp':
      return 'listens';
    case 'finding':
      return 'tells';
    case 'compute':
    case 'call':
      return 'compares';
    case 'photo':
      return 'looks';
    case 'choice':
      return step.options.some(({ picture }) => picture !== undefined) ? 'pictures' : '';
    default:
      return step?.release === undefined && step?.verify === undefined ? '' : 'looks';
  }
}
