import { airValues } from './air-values';
import { changePoints } from './change-points';
import { leakRates } from './leak-rates';
import { onboardData } from './onboard-data';
import { orificeFlows } from './orifice-flows';
import { type Reproduction } from './reproduction';
import { standardAtmosphere } from './standard-atmosphere';
import { stationPressures } from './station-pressures';
import { straightLines } from './straight-lines';
import { uncertaintyValues } from './uncertainty-values';
import { unitValues } from './unit-values';
import { vehicleNumbers } from './vehicle-numbers';

/** Every way to reproduce a check value, in the order of the sections. */
export const reproductions: readonly Reproduction[] = [
  ...standardAtmosphere,
  ...stationPressures,
  ...unitValues,
  ...airValues,
  ...leakRates,
  ...orificeFlows,
  ...straightLines,
  ...changePoints,
  ...uncertaintyValues,
  ...vehicleNumbers,
  ...onboardData,
];
