import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { sameBytes } from "./hex.ts";
import { nodeHash } from "./merkle-tree.ts";
import type { HashFunction } from "./sha256.ts";

/** The claim that a leaf stands at a place in the tree with a known root. */
export interface InclusionClaim {
  readonly index: number;
  readonly size: number;
  readonly leaf: Uint8Array;
  readonly root: Uint8Array;
  readonly proof: readonly Uint8Array[];
}

/** The claim that the tree of `size2` leaves begins with the tree of `size1` leaves. */
export interface ConsistencyClaim {
  readonly size1: number;
  readonly root1: Uint8Array;
  readonly size2: number;
  readonly root2: Uint8Array;
  readonly proof: readonly Uint8Array[];
}

/**
 * Whether a leaf is in the tree, without trusting who says so.
 * @returns good, or each reason why the proof does not hold (code `proof-invalid`)
 * Source: RFC 9162, 2.1.3.2.
 */
export function verifyInclusion(claim: InclusionClaim, hash: HashFunction): Outcome<true> {
  const { index, size, leaf, root, proof } = claim;
  const width = hash(new Uint8Array(0)).length;
  const faults = [...sizeFaults([size, index]), ...widthFaults([leaf, root, ...proof], width)];
  if (faults.length === 0 && index >= size)
    faults.push(invalid(`There is no leaf ${index} in a tree of ${size}.`));
  if (faults.length > 0) return refused(...faults);
  let [fn, sn] = [index, size - 1];
  let node = leaf;
  for (const beside of proof) {
    if (sn === 0) return refused(invalid("The proof is too long."));
    if (fn % 2 === 1 || fn === sn) {
      node = nodeHash(beside, node, hash);
      while (fn % 2 === 0 && fn > 0) [fn, sn] = [half(fn), half(sn)];
    } else {
      node = nodeHash(node, beside, hash);
    }
    [fn, sn] = [half(fn), half(sn)];
  }
  if (sn !== 0) return refused(invalid("The proof is too short."));
  return sameBytes(node, root) ? good(true) : refused(invalid("The proof leads to another root."));
}

/**
 * Whether the larger tree begins with the smaller one: nothing was changed or taken out between the two.
 * Of a tree without leaves nothing can be proved: with an empty proof that claim is good for any larger tree.
 * @returns good, or each reason why the proof does not hold (code `proof-invalid`)
 * Source: RFC 9162, 2.1.4.2.
 */
export function verifyConsistency(claim: ConsistencyClaim, hash: HashFunction): Outcome<true> {
  const { size1, root1, size2, root2, proof } = claim;
  const faults = sizeFaults([size1, size2]);
  if (size1 > size2) faults.push(invalid(`A tree of ${size1} cannot grow into one of ${size2}.`));
  if (faults.length > 0) return refused(...faults);
  if (size1 === 0 || size1 === size2) return verifyWithoutProof(claim, hash);
  const odd = widthFaults([root1, root2, ...proof], hash(new Uint8Array(0)).length);
  if (odd.length > 0) return refused(...odd);
  const [first, ...rest] = isPowerOfTwo(size1) ? [root1, ...proof] : proof;
  if (first === undefined || proof.length === 0) return refused(invalid("The proof is empty."));
  return climb(claim, first, rest, hash);
}

function verifyWithoutProof(
  { size1, root1, size2, root2, proof }: ConsistencyClaim,
  hash: HashFunction,
): Outcome<true> {
  const faults: Fault[] = [];
  if (proof.length > 0) faults.push(invalid("The proof is too long: none is needed here."));
  if (size1 === size2 && !sameBytes(root1, root2))
    faults.push(invalid("Two trees of one size have different roots."));
  if (size1 === 0 && !sameBytes(root1, hash(new Uint8Array(0)))) {
    faults.push(invalid("The tree without leaves has another root."));
  }
  return faults.length === 0 ? good(true) : refused(...faults);
}

function climb(
  { size1, root1, size2, root2 }: ConsistencyClaim,
  first: Uint8Array,
  rest: readonly Uint8Array[],
  hash: HashFunction,
): Outcome<true> {
  let [fn, sn] = [size1 - 1, size2 - 1];
  while (fn % 2 === 1) [fn, sn] = [half(fn), half(sn)];
  let [older, newer] = [first, first];
  for (const beside of rest) {
    if (sn === 0) return refused(invalid("The proof is too long."));
    if (fn % 2 === 1 || fn === sn) {
      older = nodeHash(beside, older, hash);
      newer = nodeHash(beside, newer, hash);
      while (fn % 2 === 0 && fn > 0) [fn, sn] = [half(fn), half(sn)];
    } else {
      newer = nodeHash(newer, beside, hash);
    }
    [fn, sn] = [half(fn), half(sn)];
  }
  const faults: Fault[] = [];
  if (sn !== 0) faults.push(invalid("The proof is too short."));
  if (!sameBytes(older, root1)) faults.push(invalid("The proof leads to another root of the smaller tree."));
  if (!sameBytes(newer, root2)) faults.push(invalid("The proof leads to another root of the larger tree."));
  return faults.length === 0 ? good(true) : refused(...faults);
}

function sizeFaults(numbers: readonly number[]): Fault[] {
  return numbers
    .filter((n) => !(Number.isSafeInteger(n) && n >= 0))
    .map((n) => invalid(`Sizes and places are whole numbers from 0 on; this has ${n}.`));
}

function widthFaults(hashes: readonly Uint8Array[], width: number): Fault[] {
  const odd = hashes.filter((bytes) => bytes.length !== width).length;
  return odd === 0 ? [] : [invalid(`${odd} of the hashes given do not have ${width} bytes.`)];
}

function half(n: number): number {
  return Math.floor(n / 2);
}

function isPowerOfTwo(n: number): boolean {
  return Number.isInteger(Math.log2(n)) && 2 ** Math.log2(n) === n;
}

function invalid(detail: string): Fault {
  return { code: "proof-invalid", detail };
}
