// @ts-check

/**
 * What is wrong with this Node, as a sentence with the way out; undefined when it will do. Node 20.19 is the first 20
 * that Angular 21 and TypeORM 1 both accept (their `engines`), and later majors have not been tried.
 * @param {string} version as `process.versions.node`
 */
export function nodeVersionProblem(version) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major === 20 && minor >= 19) return undefined;
  return `Bayhand runs on Node 20, from 20.19 on, and this is Node ${version}: install Node 20, check with "node --version", then run the same command again.`;
}
