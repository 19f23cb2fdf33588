/*
 * Published formulas that the product does not use: other forms of the same quantity, or methods that were weighed
 * and not taken. They reproduce their own check values and stand beside the product's results.
 */

/** Station pressure in hPa, Smithsonian Meteorological Tables, as the U.S. National Weather Service publishes it. */
export function smithsonianStationHpa(settingHpa: number, elevationM: number): number {
  const n = 0.190284;
  return (settingHpa ** n - (1013.25 ** n * 0.0065 * elevationM) / 288) ** (1 / n) + 0.3;
}

/** Station pressure in the setting's unit, the short form of the U.S. National Weather Service. */
export function shortStationPressure(setting: number, elevationM: number): number {
  return setting * ((288 - 0.0065 * elevationM) / 288) ** 5.2561;
}

/** Station pressure in inHg, as automatic weather stations at airports compute it (FAA). */
export function airportStationInHg(settingInHg: number, elevationFt: number): number {
  const n = 0.1903;
  return (settingInHg ** n - 1.313e-5 * elevationFt) ** (1 / n);
}

/** Density of moist air in kg/m3: ideal mixture with the saturation pressure of WMO-No. 8 (Magnus form). */
export function magnusDensity(pressureKpa: number, temperatureC: number, relativeHumidity: number): number {
  const vapourPa = relativeHumidity * 611.2 * Math.exp((17.62 * temperatureC) / (243.12 + temperatureC));
  const kelvin = temperatureC + 273.15;
  return (pressureKpa * 1000 - vapourPa) / (287.05287 * kelvin) + (vapourPa * 18.01528e-3) / (8.314462618 * kelvin);
}

/** Density of moist air in kg/m3 by the approximation of OIML R 111-1:2004, E.3 (from memory). */
export function oimlDensity(pressureKpa: number, temperatureC: number, relativeHumidity: number): number {
  const humidityTerm = 0.009 * relativeHumidity * 100 * Math.exp(0.061 * temperatureC);
  return (0.34848 * pressureKpa * 10 - humidityTerm) / (273.15 + temperatureC);
}

/** Vapour pressure of water in kPa over liquid water, 40 CFR 1065.645(a) (the form of Goff). */
export function saturationKpa(temperatureC: number): number {
  const ratio = 273.16 / (temperatureC + 273.15);
  const power =
    10.79574 * (1 - ratio) -
    5.028 * Math.log10(1 / ratio) +
    1.50475e-4 * (1 - 10 ** (-8.2969 * (1 / ratio - 1))) +
    0.42873e-3 * (10 ** (4.76955 * (1 - ratio)) - 1) -
    0.2138602;
  return 10 ** power;
}

/** Flow coefficient of a venturi at pressure ratio r and diameter ratio beta, 40 CFR 1065.640(c). */
export function venturiCoefficient(gamma: number, beta: number, ratio: number): number {
  const kinetic = (2 * gamma * (1 - ratio ** ((gamma - 1) / gamma))) / (gamma - 1);
  return Math.sqrt(kinetic / (ratio ** (-2 / gamma) - beta ** 4));
}

/** Flow coefficient of a choked venturi: the largest over all pressure ratios, by golden-section search. */
export function criticalVenturiCoefficient(gamma: number, beta: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [0.3, 0.95];
  while (high - low > 1e-9) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (venturiCoefficient(gamma, beta, left) < venturiCoefficient(gamma, beta, right)) low = left;
    else high = right;
  }
  return venturiCoefficient(gamma, beta, low);
}

/** Mass flow in g/s through a pneumatic component, ISO 6358-1: conductance in dm3/(s bar), critical ratio b. */
export function pneumaticGps(
  conductance: number,
  b: number,
  upstreamKpa: number,
  upstreamC: number,
  downstreamKpa: number,
): number {
  const ratio = downstreamKpa / upstreamKpa;
  const subsonic = ratio > b ? Math.sqrt(1 - ((ratio - b) / (1 - b)) ** 2) : 1;
  // 1 dm3/(s bar) is 1e-5 m3/(s kPa); 1.185 kg/m3 and 293.15 K are the reference of ISO 8778 (from memory).
  return conductance * 1e-5 * 1185 * upstreamKpa * Math.sqrt(293.15 / (upstreamC + 273.15)) * subsonic;
}

/** The tabular cumulative sum of one side: S = max(0, S + x - target - k), upper for side 1, lower for -1. */
export function cumulativeSum(x: readonly number[], target: number, k: number, side: 1 | -1, headStart = 0): number[] {
  let sum = headStart;
  return x.map((value) => (sum = Math.max(0, sum + side * (value - target) - k)));
}

/** The place, from 1, of the first sum above h; null when there is none. */
export function firstSignal(sums: readonly number[], h: number): number | null {
  const index = sums.findIndex((sum) => sum > h);
  return index < 0 ? null : index + 1;
}
