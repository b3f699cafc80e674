import {
  appendLeaf,
  checkSize,
  completedBy,
  completeSubtrees,
  EMPTY_FRONTIER,
  joined,
  type TreeNodeId,
} from "./merkle-tree.ts";
import type { HashFunction } from "./sha256.ts";

/**
 * What a proof is made of: for each of its hashes the stored complete subtrees that join into it. A server looks
 * up all of them in one query, then calls `assembleProof`.
 */
export type ProofPlan = readonly (readonly TreeNodeId[])[];

/**
 * Plan of the proof that a leaf is in the tree: the hashes beside its path, from the leaf up.
 * @param index 0-based place of the leaf, below `size`
 * @throws RangeError when `index` lies outside
 * Source: RFC 9162, 2.1.3.1.
 */
export function inclusionPlan(index: number, size: number): ProofPlan {
  checkSize(size, "size");
  if (!(Number.isSafeInteger(index) && index >= 0 && index < size)) {
    throw new RangeError(`index: expected 0 to ${size - 1}, got ${index}`);
  }
  const plan: TreeNodeId[][] = [];
  let [start, end] = [0, size];
  while (end - start > 1) {
    const middle = start + splitOf(end - start);
    if (index < middle) {
      plan.push(completeSubtrees(middle, end));
      end = middle;
    } else {
      plan.push(completeSubtrees(start, middle));
      start = middle;
    }
  }
  return plan.reverse();
}

/**
 * Plan of the proof that the tree of `size2` leaves begins with the tree of `size1` leaves. Empty when the sizes are
 * equal, and for `size1` 0, of which nothing can be proved.
 * @throws RangeError unless 0 ≤ size1 ≤ size2
 * Source: RFC 9162, 2.1.4.1.
 */
export function consistencyPlan(size1: number, size2: number): ProofPlan {
  checkSize(size1, "size1");
  checkSize(size2, "size2");
  if (size1 > size2) throw new RangeError(`size1: expected 0 to ${size2}, got ${size1}`);
  if (size1 === 0 || size1 === size2) return [];
  const plan: TreeNodeId[][] = [];
  let [start, end] = [0, size2];
  while (size1 < end) {
    const middle = start + splitOf(end - start);
    if (size1 <= middle) {
      plan.push(completeSubtrees(middle, end));
      end = middle;
    } else {
      plan.push(completeSubtrees(start, middle));
      start = middle;
    }
  }
  // The verifier knows the old root; only where the old tree ends inside is its last subtree needed as well.
  if (start > 0) plan.push(completeSubtrees(start, end));
  return plan.reverse();
}

/**
 * The proof's hashes from its plan.
 * @param readNode gives the hash of a complete subtree; throws when it is not stored
 */
export function assembleProof(
  plan: ProofPlan,
  readNode: (id: TreeNodeId) => Uint8Array,
  hash: HashFunction,
): Uint8Array[] {
  return plan.map((nodes) => {
    const whole = joined(nodes.map(readNode), hash);
    if (whole === undefined) throw new RangeError("plan: expected at least one subtree for each hash");
    return whole;
  });
}

/** The reader of all complete subtrees of a list of leaf hashes: for packs and tests, where the leaves are at hand. */
export function nodesOf(leaves: readonly Uint8Array[], hash: HashFunction): (id: TreeNodeId) => Uint8Array {
  const nodes = new Map<string, Uint8Array>();
  let frontier = EMPTY_FRONTIER;
  for (const leaf of leaves) {
    for (const node of completedBy(frontier, leaf, hash)) nodes.set(`${node.level}/${node.index}`, node.hash);
    frontier = appendLeaf(frontier, leaf, hash);
  }
  return ({ level, index }) => {
    const found = nodes.get(`${level}/${index}`);
    if (found === undefined) throw new RangeError(`id: no complete subtree ${index} at level ${level}`);
    return found;
  };
}

/** The largest power of two below `n`, for n of 2 or more. */
function splitOf(n: number): number {
  let split = 1;
  while (split * 2 < n) split *= 2;
  return split;
}
