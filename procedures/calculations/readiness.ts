/** A self-test of the vehicle's; which of them there are depends on how the fuel is lit. */
export type Monitor =
  | 'misfire'
  | 'fuelSystem'
  | 'components'
  | 'catalyst'
  | 'heatedCatalyst'
  | 'evap'
  | 'secondaryAir'
  | 'acRefrigerantOrGpf'
  | 'o2Sensor'
  | 'o2Heater'
  | 'egrVvt'
  | 'nmhcCatalyst'
  | 'noxScr'
  | 'boostPressure'
  | 'exhaustGasSensor'
  | 'pmFilter';

/** How far the vehicle has tested itself since its codes were cleared. */
export interface Readiness {
  /** The supported monitors and whether each has run to its end. */
  readonly monitors: Readonly<Partial<Record<Monitor, 'complete' | 'incomplete'>>>;
  /** Whether every supported monitor is complete. */
  readonly ready: boolean;
  /** Whether the malfunction indicator lamp is commanded on. */
  readonly mil: boolean;
  /** Confirmed trouble codes that this module holds, 0 to 127. */
  readonly codeCount: number;
  readonly ignition: 'spark' | 'compression';
}

// SAE J1979 / ISO 15031-5, PID 01. Byte B: the supported bits 0 to 2, not complete in bits 4 to 6.
const continuous: readonly Monitor[] = ['misfire', 'fuelSystem', 'components'];
/** Bits 0 to 7 of byte C (supported) and byte D (not complete); a bit without a name is reserved. */
const onceATrip: Readonly<Record<Readiness['ignition'], readonly (Monitor | undefined)[]>> = {
  // Bit 4 was the air conditioning's refrigerant and is the petrol particulate filter in later editions.
  spark: ['catalyst', 'heatedCatalyst', 'evap', 'secondaryAir', 'acRefrigerantOrGpf', 'o2Sensor', 'o2Heater', 'egrVvt'],
  compression: [
    'nmhcCatalyst',
    'noxScr',
    undefined,
    'boostPressure',
    undefined,
    'exhaustGasSensor',
    'pmFilter',
    'egrVvt',
  ],
};

const hasBit = (byte: number, bit: number): boolean => ((byte >> bit) & 1) === 1;

/**
 * Decodes the four bytes of parameter 0x01 of service 01.
 *
 *     A  bit 7 malfunction indicator lamp, bits 6 to 0 count of codes
 *     B  bits 0 to 2 supported (misfire, fuel system, components), bits 4 to 6 not complete, bit 3 compression ignition
 *     C  supported, D not complete: eight monitors, named by the ignition
 *
 * A bit of completeness counts only where the monitor is supported. Source: SAE J1979 / ISO 15031-5 (bytes B to D as
 * public tables have them; byte A and the name of bit 4 from memory).
 */
export function readinessOf([a = NaN, b = NaN, c = NaN, d = NaN]: readonly number[]): Readiness {
  const ignition = hasBit(b, 3) ? 'compression' : 'spark';
  const monitors: Partial<Record<Monitor, 'complete' | 'incomplete'>> = {};
  const add = (monitor: Monitor | undefined, isSupported: boolean, isIncomplete: boolean): void => {
    if (monitor !== undefined && isSupported) monitors[monitor] = isIncomplete ? 'incomplete' : 'complete';
  };
  continuous.forEach((monitor, bit) => add(monitor, hasBit(b, bit), hasBit(b, bit + 4)));
  onceATrip[ignition].forEach((monitor, bit) => add(monitor, hasBit(c, bit), hasBit(d, bit)));
  const ready = Object.values(monitors).every((state) => state === 'complete');
  return { monitors, ready, mil: hasBit(a, 7), codeCount: a & 0x7f, ignition };
}
