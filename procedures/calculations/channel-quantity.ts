/** What a logged channel measures, as far as its name tells. */
export type ChannelQuantity =
  | 'manifold-pressure'
  | 'boost-pressure'
  | 'gauge-pressure'
  | 'barometric-pressure'
  | 'sound-level'
  | 'coolant-temperature'
  | 'intake-temperature'
  | 'engine-speed'
  | 'air-flow';

/** In this order: a "boost sensor temperature" is no pressure, and a commanded or desired value is no measurement. */
const patterns: readonly [RegExp, ChannelQuantity | undefined][] = [
  [/\b(?:command(?:ed)?|desired|target|specified|request(?:ed)?|set ?point|solenoid|duty|voltage|volts)\b/, undefined],
  [/\b(?:ect|clt|coolant)\b/, 'coolant-temperature'],
  [
    /\b(?:iat|intake air temp\w*|intake temp\w*|intake air temperature|charge air temp\w*|air temp\w* intake)\b/,
    'intake-temperature',
  ],
  [/\b(?:maf|mass air ?flow|air ?flow|air mass|air flow rate)\b/, 'air-flow'],
  [/\b(?:rpm|engine speed|engine rpm|revs?|n engine)\b/, 'engine-speed'],
  [/\b(?:temp\w*)\b/, undefined],
  [/\b(?:sound|noise|microphone|mic|stethoscope|db|loudness)\b/, 'sound-level'],
  [/\b(?:baro\w*|ambient pressure|atmospheric pressure|bap|station pressure)\b/, 'barometric-pressure'],
  [/\b(?:boost|charge(?: air)? pressure|turbo\w* pressure|tip)\b/, 'boost-pressure'],
  [/\b(?:map|manifold(?: absolute)?(?: pressure)?|intake pressure|inlet pressure|imap)\b/, 'manifold-pressure'],
  [/\b(?:gauge|test pressure|supply pressure|regulator)\b/, 'gauge-pressure'],
];

/**
 * Tells from a channel's name what it measures: `MAP`, `Manifold pressure` and `intake_manifold_absolute_pressure` are
 * all the manifold pressure. Undefined when the name does not say, or names something commanded.
 *
 * The abbreviations are those of SAE J1930 (from memory) and common practice.
 *
 * @example channelQuantity('Boost pressure') // 'boost-pressure'
 */
export function channelQuantity(name: string): ChannelQuantity | undefined {
  const words = name
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, ' ')
    .trim();
  return patterns.find(([pattern]) => pattern.test(words))?.[1];
}
