import { decodePid, decodeTroubleCode } from '../../../procedures/calculations';
import { type Reproduction } from './reproduction';

const bytesOf = (text: unknown): Uint8Array =>
  Uint8Array.from(
    String(text)
      .split(' ')
      .map((byte) => parseInt(byte, 16)),
  );

/** The unit that ends the key of an expected value. */
const unitsByEnding: Readonly<Record<string, string>> = {
  _pct: '%',
  _c: 'degC',
  _kpa: 'kPa',
  rpm: 'rpm',
  _km_h: 'km/h',
  _g_s: 'g/s',
  _v: 'V',
};
const snake = (name: string): string => name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

const decoded = (inputs: Readonly<Record<string, unknown>>) =>
  decodePid(parseInt(String(inputs['pid']), 16), bytesOf(inputs['data']));

/** Section k: what a vehicle sends. */
export const onboardData: readonly Reproduction[] = [
  {
    topic: 'k',
    inputs: ['service', 'pid', 'data'],
    only: ({ inputs }) => inputs['pid'] !== '01',
    give: (_given, { inputs, expected }) => {
      const found = decoded(inputs);
      const [key = ''] = Object.keys(expected);
      if (!('value' in found)) throw new Error(`${key} has no value`);
      const ending = Object.keys(unitsByEnding).find((end) => key.endsWith(end)) ?? '';
      if (unitsByEnding[ending] !== found.unit) throw new Error(`${key} is in ${found.unit}`);
      return { [key]: found.value };
    },
  },
  {
    topic: 'k',
    inputs: ['service', 'pid', 'data'],
    only: ({ inputs }) => inputs['pid'] === '01',
    give: (_given, { inputs }) => {
      const found = decoded(inputs);
      if (!('monitors' in found)) throw new Error('no monitors');
      const monitors = Object.fromEntries(Object.entries(found.monitors).map(([name, state]) => [snake(name), state]));
      return {
        mil: found.mil,
        dtc_count: found.codeCount,
        ignition: found.ignition,
        monitors,
        ready: found.ready,
      };
    },
  },
  {
    topic: 'k',
    inputs: ['dtc_bytes'],
    give: (_given, { inputs }) => {
      const [high = NaN, low = NaN] = bytesOf(inputs['dtc_bytes']);
      return { text: decodeTroubleCode(high, low) ?? 'none (padding)' };
    },
  },
];
