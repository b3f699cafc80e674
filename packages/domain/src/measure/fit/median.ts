/** The middle one of three. */
const middleOf = (a: number, b: number, c: number): number =>
  Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));

/**
 * Brings the values below a pivot to the front of a stretch and gives the place after them. It has no branch that
 * depends on a value: which side it falls on is chance, and a processor that guesses it wrong waits.
 */
function bringBelow(values: Float64Array, low: number, high: number, pivot: number): number {
  let next = low;
  for (let i = low; i <= high; i++) {
    const value = values[i]!;
    values[i] = values[next]!;
    values[next] = value;
    next += Number(value < pivot);
  }
  return next;
}

/** The same with the values that equal the pivot. */
function bringUpTo(values: Float64Array, low: number, high: number, pivot: number): number {
  let next = low;
  for (let i = low; i <= high; i++) {
    const value = values[i]!;
    values[i] = values[next]!;
    values[next] = value;
    next += Number(value <= pivot);
  }
  return next;
}

/**
 * The k-th smallest of the first `count` values, which are reordered in place (Hoare's selection, Lomuto's partition).
 * @param k 0 to count - 1
 */
export function selectKth(values: Float64Array, count: number, k: number): number {
  let low = 0;
  let high = count - 1;
  while (low < high) {
    const pivot = middleOf(values[low]!, values[(low + high) >> 1]!, values[high]!);
    const above = bringBelow(values, low, high, pivot);
    if (k < above) high = above - 1;
    else if (above > low) low = above;
    else {
      // The pivot is the least: pass over all that equal it, at least one value however they compare.
      const beyond = bringUpTo(values, low, high, pivot);
      if (k < beyond) return pivot;
      low = Math.max(beyond, low + 1);
    }
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
