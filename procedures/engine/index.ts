export * from './run-event';
export * from './run-state';
