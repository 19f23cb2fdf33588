import { type Series } from './ramp-series';

/** The least (or, with sign -1, the greatest) value within `reachS` of each sample. Linear time, by a queue. */
function extremesWithin({ timeS, value }: Series, reachS: number, sign: 1 | -1): Float64Array {
  const n = value.length;
  const extremes = new Float64Array(n);
  // Indices whose values rise from the queue's head: none behind the head can be the extreme before it has left.
  const queue = new Int32Array(n);
  let [head, tail, next] = [0, 0, 0];
  const at = (index: number): number => sign * (value[index] ?? NaN);
  for (let index = 0; index < n; index++) {
    const time = timeS[index] ?? NaN;
    for (; next < n && (timeS[next] ?? NaN) <= time + reachS; next++) {
      while (tail > head && at(queue[tail - 1] ?? NaN) >= at(next)) tail--;
      queue[tail++] = next;
    }
    while ((timeS[queue[head] ?? NaN] ?? NaN) < time - reachS) head++;
    extremes[index] = value[queue[head] ?? NaN] ?? NaN;
  }
  return extremes;
}

/**
 * Gives the series with every burst that is shorter than `longestS` and stands out by more than `standsOutBy` cut down
 * to what is around it; edges that last stay where they are. Linear time.
 *
 * Source: the opening of mathematical morphology, a running minimum followed by a running maximum (Serra, 1982).
 */
export function withoutBursts(series: Series, longestS: number, standsOutBy: number): Float64Array {
  const { timeS } = series;
  const eroded = extremesWithin(series, longestS / 2, 1);
  const opened = extremesWithin({ timeS, value: eroded }, longestS / 2, -1);
  return series.value.map((value, index) => {
    const around = opened[index] ?? NaN;
    return value > around + standsOutBy ? around : value;
  });
}
