/** What a run shows after the first sight of its first step, in one file: it comes in idle time, or when it is shown. */
export { LaterStep } from './later-step';
export { RunSheets } from './sheets/run-sheets';
export { GearChoice } from './start/gear-choice';
