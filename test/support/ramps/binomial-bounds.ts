/** The chance of `hits` of `trials` at this share. */
function chanceOf(hits: number, trials: number, share: number): number {
  let logarithm = hits * Math.log(share) + (trials - hits) * Math.log(1 - share);
  for (let k = 1; k <= hits; k++) logarithm += Math.log((trials - hits + k) / k);
  return Math.exp(logarithm);
}

/** What chance alone may do in a sample: one in a thousand. */
const rare = 0.001;

/** The fewest hits that a true share may give by chance; fewer speak against it. */
export function fewestHits(trials: number, share: number): number {
  let [hits, sum] = [0, chanceOf(0, trials, share)];
  while (sum < rare) sum += chanceOf(++hits, trials, share);
  return hits;
}

/** The most hits that a true share may give by chance; more speak against it. */
export const mostHits = (trials: number, share: number): number => trials - fewestHits(trials, 1 - share);
