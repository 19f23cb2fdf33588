import { requireByte } from './byte';
import { readinessOf, type Readiness } from './readiness';
import { type UnitName } from './units';

/** A decoded value of service 01. */
export interface PidReading {
  readonly value: number;
  readonly unit: UnitName;
  /** What it is, in plain words. */
  readonly name: string;
}

interface PidDefinition {
  readonly name: string;
  readonly unit: UnitName;
  readonly bytes: number;
  /** The value of the whole number that the bytes make, high byte first. */
  readonly value: (raw: number) => number;
}

const oneByte = (name: string, unit: UnitName, value: PidDefinition['value']): PidDefinition => ({
  name,
  unit,
  bytes: 1,
  value,
});
const twoBytes = (name: string, unit: UnitName, value: PidDefinition['value']): PidDefinition => ({
  name,
  unit,
  bytes: 2,
  value,
});

const share = (raw: number): number => (raw * 100) / 255;
const trim = (raw: number): number => ((raw - 128) * 100) / 128;
const celsius = (raw: number): number => raw - 40;
const same = (raw: number): number => raw;

const readinessPid = 0x01;
const readinessBytes = 4;

// SAE J1979 / ISO 15031-5, service 01: scaling as public tables have it.
const pids: ReadonlyMap<number, PidDefinition> = new Map([
  [0x04, oneByte('Calculated engine load', '%', share)],
  [0x05, oneByte('Engine coolant temperature', 'degC', celsius)],
  [0x06, oneByte('Short-term fuel trim, bank 1', '%', trim)],
  [0x07, oneByte('Long-term fuel trim, bank 1', '%', trim)],
  [0x08, oneByte('Short-term fuel trim, bank 2', '%', trim)],
  [0x09, oneByte('Long-term fuel trim, bank 2', '%', trim)],
  [0x0b, oneByte('Intake manifold absolute pressure', 'kPa', same)],
  [0x0c, twoBytes('Engine speed', 'rpm', (raw) => raw / 4)],
  [0x0d, oneByte('Vehicle speed', 'km/h', same)],
  [0x0f, oneByte('Intake air temperature', 'degC', celsius)],
  [0x10, twoBytes('Mass air flow', 'g/s', (raw) => raw / 100)],
  [0x11, oneByte('Throttle position', '%', share)],
  [0x33, oneByte('Barometric pressure', 'kPa', same)],
  [0x42, twoBytes('Control module voltage', 'V', (raw) => raw / 1000)],
]);

const inHex = (pid: number): string => `0x${pid.toString(16).toUpperCase().padStart(2, '0')}`;

/** Gives the whole number that the bytes make, high byte first, when there are exactly `count`. */
function requireBytes(bytes: Uint8Array, count: number): number[] {
  const found = ArrayBuffer.isView(bytes) || Array.isArray(bytes) ? Array.from(bytes) : undefined;
  if (found?.length !== count) {
    const what = found === undefined ? String(bytes) : `${found.length} long`;
    throw new RangeError(`bytes is ${what}; allowed: ${count} ${count === 1 ? 'byte' : 'bytes'} of data`);
  }
  return found.map((byte, index) => requireByte(`bytes[${index}]`, byte));
}

/**
 * Decodes the data of one parameter of service 01 (current data), without the bytes that repeat service and number.
 *
 *     0x04, 0x11            A 100 / 255 %             load, throttle position
 *     0x05, 0x0F            A - 40 degC               coolant, intake air
 *     0x06 to 0x09          (A - 128) 100 / 128 %     fuel trims; negative takes fuel away
 *     0x0B, 0x33            A kPa, absolute           manifold, barometric pressure
 *     0x0C                  (256 A + B) / 4 rpm       engine speed
 *     0x0D                  A km/h                    vehicle speed
 *     0x10                  (256 A + B) / 100 g/s     mass air flow
 *     0x42                  (256 A + B) / 1000 V      control module voltage
 *     0x01                  four bytes                the readiness monitors: `Readiness`
 *
 * A vehicle whose parameter 0x4F gives a byte D other than 0 scales 0x0B as A 10 D / 255 kPa instead (from memory):
 * ask for it before believing 255 kPa.
 *
 * Throws RangeError on any other `pid` and unless `bytes` are as many as that parameter has. Source: SAE J1979 / ISO
 * 15031-5, service 01.
 *
 * @example decodePid(0x0c, Uint8Array.of(0x0b, 0xb8)) // { value: 750, unit: 'rpm', name: 'Engine speed' }
 */
export function decodePid(pid: number, bytes: Uint8Array): PidReading | Readiness {
  if (pid === readinessPid) return readinessOf(requireBytes(bytes, readinessBytes));
  const definition = pids.get(pid);
  if (definition === undefined) {
    const allowed = [readinessPid, ...pids.keys()].map(inHex).join(', ');
    throw new RangeError(`pid is ${String(pid)}; allowed: ${allowed}`);
  }
  const raw = requireBytes(bytes, definition.bytes).reduce((high, byte) => high * 256 + byte, 0);
  return { value: definition.value(raw), unit: definition.unit, name: definition.name };
}
