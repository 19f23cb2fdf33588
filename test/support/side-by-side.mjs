// @ts-check

/**
 * Runs parts side by side on so many cores: each is begun, in the given order, as soon as there is room and what it
 * waits for has ended. One that needs a part which failed is not run.
 * @template {{ name: string, cores: number, after: string[], needs: string[] }} Part
 * @template {{ name: string, failed: number }} Result
 * @param {Part[]} parts
 * @param {number} cores
 * @param {(part: Part, missing: string | undefined) => Promise<Result>} run also told what it misses, if anything
 * @returns {Promise<Result[]>} in the order of the parts
 */
export async function runSideBySide(parts, cores, run) {
  /** @type {Map<string, Result>} */
  const ended = new Map();
  const waiting = [...parts];
  /** @type {Map<Part, Promise<void>>} */
  const running = new Map();
  const begin = (/** @type {Part} */ part) => {
    waiting.splice(waiting.indexOf(part), 1);
    const missing = part.needs.find((name) => (ended.get(name)?.failed ?? 1) > 0);
    const ends = run(part, missing).then((result) => {
      ended.set(part.name, result);
      running.delete(part);
    });
    running.set(part, ends);
  };
  while (waiting.length + running.size > 0) {
    for (const part of [...waiting]) {
      const busy = [...running.keys()].reduce((total, { cores }) => total + cores, 0);
      if (busy + part.cores <= cores && [...part.after, ...part.needs].every((name) => ended.has(name))) begin(part);
    }
    if (running.size === 0) throw new Error(`Nothing can be begun of: ${waiting.map(({ name }) => name).join(', ')}`);
    await Promise.race(running.values());
  }
  return parts.flatMap(({ name }) => ended.get(name) ?? []);
}
