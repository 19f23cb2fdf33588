/** The public face of the calculations: pure functions in double precision, with the units in their names. */
export {
  convert,
  convertDifference,
  differenceFromBase,
  differenceToBase,
  fromBase,
  isUnit,
  toBase,
  unitKind,
  units,
  type UnitDefinition,
  type UnitKind,
  type UnitName,
} from './units';
