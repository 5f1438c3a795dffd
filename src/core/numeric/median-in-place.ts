/** Median of values none of which is NaN, by Hoare's selection; reorders the given array. NaN if it is empty. */
export function medianInPlace(values: Float64Array): number {
  const half = values.length >> 1;
  if (values.length === 0) return NaN;
  const upper = nthSmallest(values, half);
  return values.length % 2 === 1 ? upper : (upper + nthSmallest(values.subarray(0, half), half - 1)) / 2;
}

function nthSmallest(values: Float64Array, n: number): number {
  let [low, high] = [0, values.length - 1];
  while (low < high) {
    const pivot = values[(low + high) >> 1]!;
    let [i, j] = [low, high];
    while (i <= j) {
      while (values[i]! < pivot) i += 1;
      while (values[j]! > pivot) j -= 1;
      if (i > j) break;
      const held = values[i]!;
      values[i] = values[j]!;
      values[j] = held;
      i += 1;
      j -= 1;
    }
    if (n <= j) high = j;
    else if (n >= i) low = i;
    else break;
  }
  return values[n]!;
}
