import * as calculations from '../../../procedures/calculations';
import { airFunctions } from './air-functions';
import { type ExportedFunction } from './exported-function';
import { readingFunctions } from './reading-functions';

/** Every exported function that takes numbers. */
export const exportedFunctions: Readonly<Record<string, ExportedFunction>> = { ...airFunctions, ...readingFunctions };

/** The exported functions that take text alone and answer to any. */
export const textFunctions: Readonly<Record<string, (text: string) => unknown>> = {
  channelQuantity: calculations.channelQuantity,
  checkVin: calculations.checkVin,
  describeTroubleCode: calculations.describeTroubleCode,
  isUnit: calculations.isUnit,
  parseScanLog: calculations.parseScanLog,
};

/** What is exported beside functions. */
export const exportedTables: readonly string[] = ['units'];
