/**
 * Puts the first `count` keys in growing order, and what belongs to them with them. Points of a profile come nearly in order,
 * forward or backward, so they are put in by insertion.
 */
export function putInOrder(
  keys: Float64Array,
  others: readonly (Float64Array | Int32Array)[],
  count: number,
): void {
  if (count > 1 && keys[count - 1]! < keys[0]!)
    for (const values of [keys, ...others]) values.subarray(0, count).reverse();
  for (let i = 1; i < count; i++) {
    const key = keys[i]!;
    if (!(keys[i - 1]! > key)) continue;
    let k = i - 1;
    while (k >= 0 && keys[k]! > key) k--;
    keys.copyWithin(k + 2, k + 1, i);
    keys[k + 1] = key;
    for (const values of others) {
      const value = values[i]!;
      values.copyWithin(k + 2, k + 1, i);
      values[k + 1] = value;
    }
  }
}
