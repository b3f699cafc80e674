import { createHash } from "node:crypto";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { toHex } from "./hex.ts";
import { assembleProof, consistencyPlan, inclusionPlan, nodesOf } from "./merkle-proof.ts";
import {
  appendLeaf,
  completedBy,
  completeSubtrees,
  EMPTY_FRONTIER,
  type Frontier,
  frontierRoot,
  leafHash,
  nodeHash,
} from "./merkle-tree.ts";
import { verifyConsistency, verifyInclusion } from "./merkle-verify.ts";

const hash = (bytes: Uint8Array): Uint8Array => new Uint8Array(createHash("sha256").update(bytes).digest());

/** RFC 9162 2.1.1 as it is written there: the second implementation. */
function slowRoot(leaves: readonly Uint8Array[]): Uint8Array {
  const [only] = leaves;
  if (only === undefined) return hash(new Uint8Array(0));
  if (leaves.length === 1) return only;
  let split = 1;
  while (split * 2 < leaves.length) split *= 2;
  return nodeHash(slowRoot(leaves.slice(0, split)), slowRoot(leaves.slice(split)), hash);
}

const leavesOf = (count: number): Uint8Array[] =>
  Array.from({ length: count }, (_, i) => leafHash(Uint8Array.of(i & 255, i >> 8), hash));
const LEAVES = leavesOf(200);
const READ = nodesOf(LEAVES, hash);

const place = fc
  .integer({ min: 1, max: LEAVES.length })
  .chain((size) => fc.record({ size: fc.constant(size), index: fc.integer({ min: 0, max: size - 1 }) }));
const sizes = fc
  .integer({ min: 1, max: LEAVES.length })
  .chain((size2) => fc.record({ size2: fc.constant(size2), size1: fc.integer({ min: 1, max: size2 }) }));

function flipped(bytes: Uint8Array, bit: number): Uint8Array {
  const copy = Uint8Array.from(bytes);
  copy[bit >> 3] = copy[bit >> 3]! ^ (1 << (bit & 7));
  return copy;
}

describe("laws of the tree", () => {
  test("the root grown leaf by leaf is the root of the slow recursive definition, at every size", () => {
    let frontier: Frontier = EMPTY_FRONTIER;
    for (const [i, leaf] of LEAVES.entries()) {
      frontier = appendLeaf(frontier, leaf, hash);
      expect(toHex(frontierRoot(frontier, hash))).toBe(toHex(slowRoot(LEAVES.slice(0, i + 1))));
    }
  });

  test("appending leaves the frontier it started from as it was", () => {
    const three = LEAVES.slice(0, 3).reduce((tree, leaf) => appendLeaf(tree, leaf, hash), EMPTY_FRONTIER);
    const before = toHex(frontierRoot(three, hash));
    appendLeaf(three, LEAVES[3]!, hash);
    expect(three.size).toBe(3);
    expect(toHex(frontierRoot(three, hash))).toBe(before);
  });

  test("the nodes an append completes are the roots of their own leaves", () => {
    let frontier: Frontier = EMPTY_FRONTIER;
    for (const leaf of LEAVES.slice(0, 64)) {
      for (const { level, index, hash: node } of completedBy(frontier, leaf, hash)) {
        const own = LEAVES.slice(index * 2 ** level, (index + 1) * 2 ** level);
        expect(toHex(node)).toBe(toHex(slowRoot(own)));
      }
      frontier = appendLeaf(frontier, leaf, hash);
    }
  });

  test("subtrees cover a range without gap, also where sizes pass 32 bits", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2 ** 52 }), (size) => {
        let at = 0;
        for (const { level, index } of completeSubtrees(0, size)) {
          expect(index * 2 ** level).toBe(at);
          at += 2 ** level;
        }
        expect(at).toBe(size);
      }),
    );
  });

  test("a frontier that does not fit its size is refused", () => {
    expect(() => frontierRoot({ size: 3, hashes: [LEAVES[0]!] }, hash)).toThrow(
      /expected 2 hashes for size 3/,
    );
    expect(() => appendLeaf({ size: -1, hashes: [] }, LEAVES[0]!, hash)).toThrow(RangeError);
    expect(() => appendLeaf({ size: 0.5, hashes: [] }, LEAVES[0]!, hash)).toThrow(RangeError);
    expect(() => inclusionPlan(3, 3)).toThrow(RangeError);
    expect(() => consistencyPlan(4, 3)).toThrow(RangeError);
  });
});

describe("laws of proofs", () => {
  test("every leaf's proof verifies, and no other leaf, place, size or root does with it", () => {
    fc.assert(
      fc.property(place, fc.nat(255), fc.nat(7), ({ size, index }, bit, which) => {
        const proof = assembleProof(inclusionPlan(index, size), READ, hash);
        const claim = { index, size, leaf: LEAVES[index]!, root: slowRoot(LEAVES.slice(0, size)), proof };
        expect(verifyInclusion(claim, hash)).toEqual({ ok: true, value: true });
        const broken = [
          { ...claim, leaf: flipped(claim.leaf, bit) },
          { ...claim, root: flipped(claim.root, bit) },
          { ...claim, index: index + 1 },
          { ...claim, index: index - 1 },
          { ...claim, index: size },
          { ...claim, index: index + 0.5 },
          { ...claim, proof: [...proof, claim.root] },
          { ...claim, proof: [claim.leaf, ...proof] },
          { ...claim, root: claim.root.subarray(0, 31) },
        ];
        if (proof.length > 0) {
          const at = which % proof.length;
          broken.push({ ...claim, proof: proof.slice(1) });
          broken.push({ ...claim, proof: proof.slice(0, -1) });
          broken.push({ ...claim, proof: proof.with(at, flipped(proof[at]!, bit)) });
        }
        for (const wrong of broken) expect(verifyInclusion(wrong, hash).ok).toBe(false);
      }),
      { numRuns: 200 },
    );
  });

  test("every earlier tree is proved consistent, and no changed one is", () => {
    fc.assert(
      fc.property(sizes, fc.nat(255), ({ size1, size2 }, bit) => {
        const proof = assembleProof(consistencyPlan(size1, size2), READ, hash);
        const root1 = slowRoot(LEAVES.slice(0, size1));
        const root2 = slowRoot(LEAVES.slice(0, size2));
        const claim = { size1, root1, size2, root2, proof };
        expect(verifyConsistency(claim, hash)).toEqual({ ok: true, value: true });
        const broken = [
          { ...claim, root1: flipped(root1, bit) },
          { ...claim, root2: flipped(root2, bit) },
          { ...claim, proof: [...proof, root1] },
          { ...claim, proof: [root1, ...proof] },
          { ...claim, size1: size2 + 1 },
          { ...claim, size1: -1 },
        ];
        if (size1 < size2) broken.push({ ...claim, proof: [] }, { ...claim, root1: root2, root2: root1 });
        if (proof.length > 0) broken.push({ ...claim, proof: proof.with(0, flipped(proof[0]!, bit)) });
        for (const wrong of broken) expect(verifyConsistency(wrong, hash).ok).toBe(false);
      }),
      { numRuns: 200 },
    );
  });

  test("a tree that was rewritten after the checkpoint cannot be proved consistent", () => {
    const rewritten = LEAVES.with(5, leafHash(Uint8Array.of(99), hash));
    const proof = assembleProof(consistencyPlan(10, 20), nodesOf(rewritten, hash), hash);
    const outcome = verifyConsistency(
      {
        size1: 10,
        root1: slowRoot(LEAVES.slice(0, 10)),
        size2: 20,
        root2: slowRoot(rewritten.slice(0, 20)),
        proof,
      },
      hash,
    );
    expect(outcome.ok).toBe(false);
  });

  test("a proof has no more hashes than the tree has levels", () => {
    expect(inclusionPlan(123_456, 1_000_000).length).toBeLessThanOrEqual(20);
    expect(consistencyPlan(123_456, 1_000_000).length).toBeLessThanOrEqual(21);
  });

  test("a tree without leaves is the beginning of any, but only with its own root", () => {
    const root2 = slowRoot(LEAVES.slice(0, 4));
    const empty = hash(new Uint8Array(0));
    expect(verifyConsistency({ size1: 0, root1: empty, size2: 4, root2, proof: [] }, hash).ok).toBe(true);
    expect(verifyConsistency({ size1: 0, root1: root2, size2: 4, root2, proof: [] }, hash).ok).toBe(false);
  });
});
