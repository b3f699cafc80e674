/**
 * The k-th smallest of the first `count` values, which are reordered in place (Hoare's selection).
 * @param k 0 to count - 1
 */
export function selectKth(values: Float64Array, count: number, k: number): number {
  let low = 0;
  let high = count - 1;
  while (low < high) {
    const pivot = values[(low + high) >> 1]!;
    let i = low;
    let j = high;
    while (i <= j) {
      while (values[i]! < pivot) i += 1;
      while (values[j]! > pivot) j -= 1;
      if (i > j) break;
      const kept = values[i]!;
      values[i] = values[j]!;
      values[j] = kept;
      i += 1;
      j -= 1;
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return values[k]!;
}

/** The median of the first `count` values, which are reordered; the lower middle of an even count. NaN of none. */
export function medianInPlace(values: Float64Array, count: number): number {
  return count > 0 ? selectKth(values, count, (count - 1) >> 1) : Number.NaN;
}

let copied = new Float64Array(64);

/** Some values in an array that may be reordered; it serves again at the next call. */
function copyOf(values: ArrayLike<number>): Float64Array {
  const { length } = values;
  if (copied.length < length) copied = new Float64Array(2 * length);
  for (let i = 0; i < length; i++) copied[i] = values[i]!;
  return copied;
}

/** The median of some values; they stay as they are. NaN of none. */
export function medianOf(values: ArrayLike<number>): number {
  return medianInPlace(copyOf(values), values.length);
}
