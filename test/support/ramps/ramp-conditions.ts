import { type RampKind } from './simulated-ramp';

/** Ramps on which the valve shuts for good; what is found has to agree with the truth. */
export const sealingConditions: ReadonlyMap<string, RampKind> = new Map<string, RampKind>([
  ['clean, gauge to 0.01 kPa', { valve: 'seals', gear: 'fine-gauge' }],
  ['clean, gauge to 0.1 kPa', { valve: 'seals' }],
  ['manifold sensor alone, 0.1 kPa', { valve: 'seals', gear: 'bus' }],
  ['manifold sensor alone, 1 kPa', { valve: 'seals', gear: 'coarse-bus' }],
  ['manifold sensor alone, 1 kPa, by hand in steps', { valve: 'seals', gear: 'coarse-bus', supply: 'stepped' }],
  ['uneven sampling', { valve: 'seals', jitterShare: 0.6 }],
  ['gaps anywhere', { valve: 'seals', gaps: 'anywhere' }],
  ['a gap at the seal', { valve: 'seals', gaps: 'at-the-seal' }],
  ['a floor that drifts', { valve: 'seals', floorDrifts: true }],
  ['coughs', { valve: 'seals', coughs: true }],
  ['a valve that chatters', { valve: 'chatters-then-seals' }],
  ['a small drop, 4 to 8 dB', { valve: 'seals', dropDb: [4, 8] }],
  ['by hand in steps', { valve: 'seals', supply: 'stepped' }],
  ['pressure held', { valve: 'seals', supply: 'held' }],
  ['bled back at the end', { valve: 'seals', supply: 'bled' }],
  ['end of travel after the seal', { valve: 'seals', supply: 'end-of-travel' }],
  [
    'everything at once',
    {
      valve: 'chatters-then-seals',
      supply: 'held',
      floorDrifts: true,
      coughs: true,
      jitterShare: 0.6,
      gaps: 'anywhere',
    },
  ],
]);

/** Ramps on which nothing seals while somebody listens; none may be called sealed. */
export const neverSealingConditions: ReadonlyMap<string, RampKind> = new Map<string, RampKind>([
  ['never seals', { valve: 'stays-open' }],
  ['never seals, manifold sensor alone, 1 kPa', { valve: 'stays-open', gear: 'coarse-bus' }],
  ['never seals, gaps', { valve: 'stays-open', gaps: 'anywhere', jitterShare: 0.6 }],
  ['never seals, a floor that drifts', { valve: 'stays-open', floorDrifts: true }],
  ['never seals, coughs', { valve: 'stays-open', coughs: true }],
  ['never seals, chatters', { valve: 'chatters-stays-open' }],
  ['never seals, by hand in steps', { valve: 'stays-open', supply: 'stepped' }],
  ['never seals, pressure held', { valve: 'stays-open', supply: 'held' }],
  ['never seals, bled back at the end', { valve: 'stays-open', supply: 'bled' }],
  ['never seals, bled back, manifold sensor alone, 1 kPa', { valve: 'stays-open', supply: 'bled', gear: 'coarse-bus' }],
  ['never seals, end of travel', { valve: 'stays-open', supply: 'end-of-travel' }],
  [
    'never seals, everything at once',
    {
      valve: 'chatters-stays-open',
      supply: 'held',
      floorDrifts: true,
      coughs: true,
      jitterShare: 0.6,
      gaps: 'anywhere',
    },
  ],
  ['sealed from the start', { valve: 'sealed-from-the-start' }],
  [
    'sealed from the start, coughs, drift, bled back',
    { valve: 'sealed-from-the-start', floorDrifts: true, coughs: true, supply: 'bled' },
  ],
]);
