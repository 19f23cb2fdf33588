import type { HonestWay } from '../frame/honest-ways';

/** A card laid over the step. */
export type LaidSheet =
  | { readonly show: 'open-list' | 'view' | 'why' | 'gear' }
  | { readonly show: 'look-back'; readonly bead: number }
  | { readonly show: 'way-out'; readonly way: HonestWay }
  | { readonly show: 'take-again'; readonly of: string; readonly said: string };
