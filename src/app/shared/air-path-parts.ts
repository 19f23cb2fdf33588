import type { AirPathPart } from '../../../procedures/library/picture-parts';

/** A part of the air path sheet: where its label points, and the room that the drawn part takes. */
export interface SheetPart {
  readonly id: AirPathPart;
  /** What the part is called where a step gives no words of its own. */
  readonly name: string;
  /** Left, top, width, height in the sheet's units. */
  readonly box: readonly [number, number, number, number];
}

/** Every part that a step may mark on the sheet `air-path`. */
export const airPathParts: readonly SheetPart[] = [
  { id: 'air-box', name: 'air box', box: [24, 208, 94, 84] },
  { id: 'inlet-duct', name: 'inlet duct', box: [118, 236, 84, 32] },
  { id: 'plug', name: 'plug in the inlet duct', box: [104, 226, 22, 52] },
  { id: 'air-flow-sensor', name: 'air flow sensor', box: [140, 226, 34, 30] },
  { id: 'compressor', name: 'compressor', box: [200, 212, 80, 80] },
  { id: 'charge-pipe', name: 'charge pipe', box: [224, 108, 58, 106] },
  { id: 'charge-cooler', name: 'charge air cooler', box: [280, 92, 86, 62] },
  { id: 'boost-sensor', name: 'boost pressure sensor', box: [377, 70, 30, 40] },
  { id: 'throttle', name: 'throttle', box: [366, 106, 108, 34] },
  { id: 'manifold', name: 'intake manifold', box: [474, 96, 170, 80] },
  { id: 'manifold-sensor', name: 'manifold pressure sensor', box: [585, 60, 30, 36] },
  { id: 'manifold-valve', name: 'crankcase valve', box: [471, 109, 30, 30] },
  { id: 'crankcase-passage', name: 'crankcase passage', box: [480, 138, 12, 80] },
  { id: 'head', name: 'cylinder head', box: [474, 176, 166, 28] },
  { id: 'crankcase', name: 'crankcase', box: [474, 204, 166, 100] },
  { id: 'inlet-vent', name: 'inlet vent hose', box: [244, 184, 230, 30] },
  { id: 'inlet-check-valve', name: 'inlet check valve', box: [316, 176, 28, 28] },
  { id: 'dipstick', name: 'dipstick', box: [638, 164, 30, 70] },
  { id: 'supply', name: 'regulator and gauge', box: [82, 84, 92, 144] },
  { id: 'probe', name: 'listening probe', box: [180, 46, 44, 190] },
];
