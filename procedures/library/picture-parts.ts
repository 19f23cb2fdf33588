/** The drawn sheets by name, each with the ids of the parts that a step may mark on it. */
export const pictureParts = {
  'air-path': [
    'air-box',
    'inlet-duct',
    'plug',
    'air-flow-sensor',
    'compressor',
    'charge-pipe',
    'charge-cooler',
    'boost-sensor',
    'throttle',
    'manifold',
    'manifold-sensor',
    'manifold-valve',
    'crankcase-passage',
    'head',
    'crankcase',
    'inlet-vent',
    'inlet-check-valve',
    'dipstick',
    'supply',
    'probe',
  ],
} as const;

/** A part of the air path sheet. */
export type AirPathPart = (typeof pictureParts)['air-path'][number];
