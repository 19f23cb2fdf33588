/** Puts the k-th smallest number of values[0..length) into its place and gives it; expected linear time, in place. */
function selectInPlace(values: Float64Array, length: number, k: number): number {
  let low = 0;
  let high = length - 1;
  while (low < high) {
    const pivot = values[(low + high) >> 1] ?? NaN;
    let left = low;
    let right = high;
    while (left <= right) {
      while ((values[left] ?? Infinity) < pivot) left++;
      while ((values[right] ?? -Infinity) > pivot) right--;
      if (left > right) break;
      const swapped = values[left] ?? NaN;
      values[left] = values[right] ?? NaN;
      values[right] = swapped;
      left++;
      right--;
    }
    if (k <= right) high = right;
    else if (k >= left) low = left;
    else break;
  }
  return values[k] ?? NaN;
}

/**
 * Gives the median of the first `length` values, which it reorders: the middle one, or the mean of the middle two.
 *
 * Throws RangeError when there are none. Expected linear time.
 */
export function medianInPlace(values: Float64Array, length = values.length): number {
  if (length < 1) throw new RangeError(`length is ${length}; allowed: 1 or more`);
  const middle = length >> 1;
  const upper = selectInPlace(values, length, middle);
  if (length % 2 === 1) return upper;
  // After the selection everything before the middle is no larger; the largest of it is the other middle value.
  let lower = -Infinity;
  for (let index = 0; index < middle; index++) lower = Math.max(lower, values[index] ?? -Infinity);
  return (lower + upper) / 2;
}

/** Gives the median of values[from..to), leaving them as they are. Throws RangeError when there are none. */
export function medianOf(values: ArrayLike<number>, from = 0, to = values.length): number {
  const copy = new Float64Array(Math.max(0, to - from));
  for (let index = from; index < to; index++) copy[index - from] = values[index] ?? NaN;
  return medianInPlace(copy);
}

/**
 * Gives the running median of five: a spike of one or two values leaves no trace, while an edge stays where it is. The
 * first and last two values have the median of as many neighbours as there are on both sides. Linear time.
 */
export function runningMedianOfFive(values: Float64Array): Float64Array {
  const n = values.length;
  const medians = Float64Array.from(values);
  for (const index of n < 3 ? [] : [1, n - 2]) medians[index] = medianOf(values, index - 1, index + 2);
  let [a = NaN, b = NaN, c = NaN, d = NaN] = values;
  for (let index = 2; index < n - 2; index++) {
    const e = values[index + 2] ?? NaN;
    // Of two ordered pairs the smaller minimum and the larger maximum cannot be the median of the five.
    const low = Math.max(Math.min(a, b), Math.min(c, d));
    const high = Math.min(Math.max(a, b), Math.max(c, d));
    medians[index] = low > high ? Math.max(high, Math.min(low, e)) : Math.max(low, Math.min(high, e));
    a = b;
    b = c;
    c = d;
    d = e;
  }
  return medians;
}
