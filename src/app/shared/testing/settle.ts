/**
 * Lets answers, the offline store's reads and the drawing that follows come to rest. For specs. It waits for time
 * alone: a page whose request is never answered is not stable, and may be what a spec looks at.
 */
export async function settle(): Promise<void> {
  for (let turns = 0; turns < 8; turns += 1) await new Promise((resolve) => setTimeout(resolve, 4));
}
