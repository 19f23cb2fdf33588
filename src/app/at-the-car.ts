/** A visit leads into its run: both come in one file, so that beginning a run waits for no other. */
export { routes as runRoutes } from './run/run.routes';
export { routes as visitRoutes } from './visit/visit.routes';
