/** Node's codes of a database that is not there (any more). */
const networkCodes = ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'ENOTFOUND', 'EAI_AGAIN'];
/**
 * PostgreSQL's (appendix A of its manual): class 08 connection, 57P01 to 57P05 shut down or starting, 53300 too many
 * connections, 40001 and 40P01 a transaction that lost against another.
 */
const sqlStates = /^(?:08...|57P0[1-5]|53300|40001|40P01)$/;

/** Whether a failure comes from a database that can not serve at the moment: asking again is the right thing then. */
export function isUnavailable(error: unknown): boolean {
  if (typeof error !== 'object' || error === null) return false;
  const { code, message, driverError, errors } = error as Record<string, unknown>;
  if (typeof code === 'string' && (networkCodes.includes(code) || sqlStates.test(code))) return true;
  // The driver has no code for a connection that broke under a question, or that none became free in time.
  if (/^(?:Connection terminated|timeout exceeded when trying to connect)/.test(String(message))) return true;
  if (Array.isArray(errors)) return errors.some(isUnavailable);
  return driverError !== undefined && driverError !== error && isUnavailable(driverError);
}
