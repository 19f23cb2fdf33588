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
