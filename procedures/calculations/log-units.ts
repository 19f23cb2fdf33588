import { isUnit, type UnitName } from './units';

/** How loggers write the units of the table, in lower case without blanks, degree signs and points. */
const aliases: ReadonlyMap<string, UnitName> = new Map<string, UnitName>([
  ['mbar', 'hPa'],
  ['hectopascal', 'hPa'],
  ['kpaa', 'kPa'],
  ['kpag', 'kPa'],
  ['kpaabs', 'kPa'],
  ['psia', 'psi'],
  ['psig', 'psi'],
  ['lbf/in2', 'psi'],
  ['"hg', 'inHg'],
  ['inchhg', 'inHg'],
  ['"h2o', 'inH2O'],
  ['inwc', 'inH2O'],
  ['inchh2o', 'inH2O'],
  ['c', 'degC'],
  ['celsius', 'degC'],
  ['\u2103', 'degC'],
  ['f', 'degF'],
  ['fahrenheit', 'degF'],
  ['\u2109', 'degF'],
  ['kelvin', 'K'],
  ['lpm', 'L/min'],
  ['cfm', 'ft3/min'],
  ['gps', 'g/s'],
  ['g/sec', 'g/s'],
  ['gm/s', 'g/s'],
  ['gr/s', 'g/s'],
  ['kg/hr', 'kg/h'],
  ['litre', 'L'],
  ['liter', 'L'],
  ['cc', 'cm3'],
  ['cm\u00b3', 'cm3'],
  ['mile', 'mi'],
  ['miles', 'mi'],
  ['n\u00b7m', 'Nm'],
  ['n*m', 'Nm'],
  ['lbft', 'lbf.ft'],
  ['lb-ft', 'lbf.ft'],
  ['ftlb', 'lbf.ft'],
  ['ft-lb', 'lbf.ft'],
  ['lb*ft', 'lbf.ft'],
  ['volt', 'V'],
  ['volts', 'V'],
  ['\u03c9', 'ohm'],
  ['ohms', 'ohm'],
  ['k\u03c9', 'kohm'],
  ['sec', 's'],
  ['secs', 's'],
  ['second', 's'],
  ['seconds', 's'],
  ['minute', 'min'],
  ['minutes', 'min'],
  ['hr', 'h'],
  ['hrs', 'h'],
  ['hour', 'h'],
  ['hours', 'h'],
  ['kph', 'km/h'],
  ['kmh', 'km/h'],
  ['kmph', 'km/h'],
  ['mi/h', 'mph'],
  ['pct', '%'],
  ['percent', '%'],
  ['1/min', 'rpm'],
  ['min-1', 'rpm'],
  ['r/min', 'rpm'],
  ['rev/min', 'rpm'],
  ['dba', 'dB'],
  ['dbfs', 'dB'],
]);

const plain = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[\s\u00b0\u00ba]|deg(?:rees?)?\.?/g, '')
    .replace(/\.$/, '');

/** The table's own names in the spelling that `plain` leaves of them. */
const ownNames: ReadonlyMap<string, UnitName> = new Map(
  ['kPa', 'Pa', 'hPa', 'bar', 'psi', 'inHg', 'inH2O', 'mmHg', 'L/min', 'ft3/min', 'm3/s', 'g/s', 'kg/h', 'lb/min']
    .concat([
      'L',
      'cm3',
      'm',
      'km',
      'mi',
      'Nm',
      'lbf.ft',
      'V',
      'ohm',
      'kohm',
      's',
      'min',
      'h',
      'km/h',
      'mph',
      '%',
      'rpm',
      'dB',
      'K',
    ])
    .filter(isUnit)
    .map((name) => [plain(name), name]),
);

/**
 * Gives the unit of the table that a logger's spelling means, such as `degF` for `F` or `hPa` for `mbar`; undefined for
 * a unit that the table has not. mV and MV are told apart by nothing but their case, so only `mV` itself counts.
 */
export function unitNamed(text: string): UnitName | undefined {
  const trimmed = text.trim();
  if (trimmed !== '1' && isUnit(trimmed)) return trimmed;
  const spelling = plain(trimmed);
  return ownNames.get(spelling) ?? aliases.get(spelling);
}

/** Units that a file may give and `convert` has no use for. */
const otherUnit =
  /^(?:ms|msec|milliseconds?|us|ma|a|deg|\u00b0|hz|khz|w|kw|hp|nm3\/h|mg\/str(?:oke)?|mg|g|lambda|ratio|count|bits?|boolean|on\/off|steps?|\u00b5s|stoich|degrees|text|hex|enum|state|-|--)$/i;

/** Whether the text is a unit of any kind, as in a row of units below the header. */
export const isUnitText = (text: string): boolean =>
  unitNamed(stripBrackets(text)) !== undefined || otherUnit.test(stripBrackets(text));

const stripBrackets = (text: string): string => text.trim().replace(/^[[({<]\s*(.*?)\s*[\])}>]$/, '$1');

/** A unit as the rest of the program writes it: the table's name where it has one, else as the file has it. */
export const unitAsWritten = (text: string): string | undefined => {
  const stripped = stripBrackets(text);
  return unitNamed(stripped) ?? (/^-*$/.test(stripped) ? undefined : stripped);
};

/** A header's name and the unit glued to it, if any. */
export interface NamedUnit {
  readonly name: string;
  readonly unit: string | undefined;
}

const inBrackets = /^(.*?)\s*[[({<]\s*([^[\](){}<>]*?)\s*[\])}>]\s*$/;
const afterSeparator = /^(.+?)(_|\s*[,/]\s+|\s+)([^\s_]+)$/;
/** A last word of one letter is a unit only behind an underscore: `time_s`, but not `Bank A`. */
const isTooShort = (unit: string, separator: string): boolean => unit.length < 2 && separator !== '_' && unit !== '%';

/** Takes a header apart: `MAP(inHg)`, `MAP [kPa]`, `map_kpa` and `Engine speed rpm` all carry their unit. */
export function nameAndUnit(header: string): NamedUnit {
  const bracketed = inBrackets.exec(header);
  if (bracketed !== null) {
    const [, name = '', unit = ''] = bracketed;
    if (name !== '' && isUnitText(unit)) return { name: name.trim(), unit: unitAsWritten(unit) };
    // What stands in brackets may be a remark, and the unit before it.
  }
  const [, name = '', separator = '', last = ''] = afterSeparator.exec(header) ?? [];
  if (name !== '' && !isTooShort(last, separator) && (unitNamed(last) !== undefined || /^ms$/i.test(last))) {
    return { name: name.trim(), unit: unitNamed(last) ?? last.toLowerCase() };
  }
  return { name: header.trim(), unit: undefined };
}
