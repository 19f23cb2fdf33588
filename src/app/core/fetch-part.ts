/** How long a part of the app that could not be fetched is left before it is asked for again, milliseconds. */
const pausesMs: readonly number[] = [200, 1_000];

const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/**
 * Fetches a part of the app that comes when it is needed, by its `import()`. A browser may give such a fetch up for
 * reasons of its own, though the part is there: it is asked for up to three times. Rejects as the last time did.
 */
export async function fetchPart<T>(load: () => Promise<T>, wait: (ms: number) => Promise<void> = pause): Promise<T> {
  for (const ms of pausesMs) {
    try {
      return await load();
    } catch {
      await wait(ms);
    }
  }
  return load();
}
