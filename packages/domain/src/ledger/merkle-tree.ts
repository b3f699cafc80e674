import type { HashFunction } from "./sha256.ts";

/** A complete subtree: the 2^level leaves from index × 2^level on. Level 0 is the leaves themselves. */
export interface TreeNodeId {
  readonly level: number;
  readonly index: number;
}

/** A complete subtree with its hash: never changes once the tree has grown past it. */
export interface TreeNode extends TreeNodeId {
  readonly hash: Uint8Array;
}

/** What a tree must remember to grow: its size and the hashes of its complete subtrees, largest first. */
export interface Frontier {
  readonly size: number;
  readonly hashes: readonly Uint8Array[];
}

/** The tree without leaves. */
export const EMPTY_FRONTIER: Frontier = { size: 0, hashes: [] };

const LEAF_PREFIX = 0x00;
const NODE_PREFIX = 0x01;

/** Hash of a leaf: H(0x00 ‖ data). Source: RFC 9162, 2.1.1. */
export function leafHash(data: Uint8Array, hash: HashFunction): Uint8Array {
  const bytes = new Uint8Array(1 + data.length);
  bytes[0] = LEAF_PREFIX;
  bytes.set(data, 1);
  return hash(bytes);
}

/** Hash of an inner node: H(0x01 ‖ left ‖ right). Source: RFC 9162, 2.1.1. */
export function nodeHash(left: Uint8Array, right: Uint8Array, hash: HashFunction): Uint8Array {
  const bytes = new Uint8Array(1 + left.length + right.length);
  bytes[0] = NODE_PREFIX;
  bytes.set(left, 1);
  bytes.set(right, 1 + left.length);
  return hash(bytes);
}

/**
 * Every complete subtree that appending one leaf completes: the leaf itself, then each larger one. Storing them by
 * level and index lets proofs be built later without reading the leaves again.
 * @returns one node a level, smallest first; their number is one more than the trailing one bits of the size
 */
export function completedBy(frontier: Frontier, leaf: Uint8Array, hash: HashFunction): TreeNode[] {
  checkFrontier(frontier);
  const nodes: TreeNode[] = [{ level: 0, index: frontier.size, hash: leaf }];
  let rest = frontier.size;
  let node = leaf;
  for (let level = 1; rest % 2 === 1; level++) {
    node = nodeHash(frontier.hashes[frontier.hashes.length - level]!, node, hash);
    rest = (rest - 1) / 2;
    nodes.push({ level, index: rest, hash: node });
  }
  return nodes;
}

/**
 * The tree with one leaf more.
 * @param leaf the leaf's hash (`leafHash`)
 * @returns a new frontier; the old one stays as it was. Cost: one hash on average, log2 of the size at most
 * @throws RangeError when the frontier's hashes do not fit its size, or the size would leave the safe integers
 */
export function appendLeaf(frontier: Frontier, leaf: Uint8Array, hash: HashFunction): Frontier {
  const completed = completedBy(frontier, leaf, hash);
  const kept = frontier.hashes.slice(0, frontier.hashes.length - (completed.length - 1));
  return { size: frontier.size + 1, hashes: [...kept, completed[completed.length - 1]!.hash] };
}

/**
 * The tree's root, in at most log2(size) hashes; of the empty tree the hash of nothing.
 * Source: RFC 9162, 2.1.1.
 */
export function frontierRoot(frontier: Frontier, hash: HashFunction): Uint8Array {
  checkFrontier(frontier);
  return joined(frontier.hashes, hash) ?? hash(new Uint8Array(0));
}

/** The root of a list of leaf hashes. Cost: one hash a leaf. Source: RFC 9162, 2.1.1. */
export function rootOf(leaves: readonly Uint8Array[], hash: HashFunction): Uint8Array {
  let frontier = EMPTY_FRONTIER;
  for (const leaf of leaves) frontier = appendLeaf(frontier, leaf, hash);
  return frontierRoot(frontier, hash);
}

/** The hash over neighbouring complete subtrees, largest first: from the right, as the tree joins them. */
export function joined(hashes: readonly Uint8Array[], hash: HashFunction): Uint8Array | undefined {
  return hashes.reduceRight<Uint8Array | undefined>(
    (right, left) => (right === undefined ? left : nodeHash(left, right, hash)),
    undefined,
  );
}

/**
 * The complete subtrees that make up the leaves from `start` to before `end`, largest first.
 * @param start a multiple of the smallest power of two not below `end - start`
 */
export function completeSubtrees(start: number, end: number): TreeNodeId[] {
  const nodes: TreeNodeId[] = [];
  let at = start;
  while (at < end) {
    const level = Math.floor(Math.log2(end - at));
    // log2 of numbers near 2^48 and above can round up to the next whole number.
    const fitting = 2 ** level > end - at ? level - 1 : level;
    nodes.push({ level: fitting, index: at / 2 ** fitting });
    at += 2 ** fitting;
  }
  return nodes;
}

function checkFrontier(frontier: Frontier): void {
  checkSize(frontier.size, "size");
  let ones = 0;
  for (let rest = frontier.size; rest > 0; rest = Math.floor(rest / 2)) ones += rest % 2;
  if (frontier.hashes.length !== ones) {
    throw new RangeError(
      `frontier: expected ${ones} hashes for size ${frontier.size}, got ${frontier.hashes.length}`,
    );
  }
}

/** @throws RangeError unless it is a whole number from 0 on that can be counted up by one without loss */
export function checkSize(size: number, name: string): void {
  if (!(Number.isSafeInteger(size) && size >= 0 && size < Number.MAX_SAFE_INTEGER)) {
    throw new RangeError(`${name}: expected a safe whole number from 0 on, got ${size}`);
  }
}
