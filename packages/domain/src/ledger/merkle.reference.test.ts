import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import { readShared } from "../../vectors/shared-vectors.ts";
import { fromHex, toHex } from "./hex.ts";
import { assembleProof, consistencyPlan, inclusionPlan, nodesOf } from "./merkle-proof.ts";
import { appendLeaf, EMPTY_FRONTIER, frontierRoot, leafHash, nodeHash, rootOf } from "./merkle-tree.ts";
import { verifyConsistency, verifyInclusion } from "./merkle-verify.ts";
import { sha256 } from "./sha256.ts";
import { utf8 } from "./utf8.ts";

/** The eight leaves that the Certificate Transparency projects have used since RFC 6962, and their roots by size. */
const LEAVES_HEX = [
  "",
  "00",
  "10",
  "2021",
  "3031",
  "40414243",
  "5051525354555657",
  "606162636465666768696a6b6c6d6e6f",
];
const ROOTS_HEX = [
  "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855",
  "6e340b9cffb37a989ca544e6bb780a2c78901d3fb33738768511a30617afa01d",
  "fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125",
  "aeb6bcfe274b70a14fb067a5e5578264db0fa9b51af5e0ba159158f329e06e77",
  "d37ee418976dd95753c1c73862b9398fa2a2cf9b4ff0fdfe8b30cd95209614b7",
  "4e3bbb1f7b478dcfe71fb631631519a3bca12c9aefca1612bfce4c13a86264d4",
  "76e67dadbcdf1e10e1b74ddc608abd2f98dfb16fbce75277b5232a127f2087ef",
  "ddb89be403809e325750d3d263cd78929c2942b7942a34b77e122c9594a74c8c",
  "5dc9da79a70659a9ad559cb701ded9a2ab9d823aad2f4960cfe370eff4604328",
];
const leaves = LEAVES_HEX.map((hex) => leafHash(fromHex(hex), sha256));

const base64 = z.string().transform((text) => new Uint8Array(Buffer.from(text, "base64")));
const proof = z
  .array(base64)
  .nullable()
  .transform((hashes) => hashes ?? []);
const Inclusion = z.object({
  cases: z
    .array(
      z.object({
        name: z.string(),
        leafIdx: z.number(),
        treeSize: z.number(),
        root: base64,
        leafHash: base64,
        proof,
        wantErr: z.boolean(),
      }),
    )
    .min(20),
});
const Consistency = z.object({
  cases: z
    .array(
      z.object({
        name: z.string(),
        size1: z.number(),
        size2: z.number(),
        root1: base64,
        root2: base64,
        proof,
        wantErr: z.boolean(),
      }),
    )
    .min(20),
});
const EightLeafProofs = z.object({
  cases: z
    .array(
      z.union([
        z.object({
          kind: z.literal("inclusion"),
          index: z.number(),
          size: z.number(),
          proof_hex: z.array(z.string()),
        }),
        z.object({
          kind: z.literal("consistency"),
          first: z.number(),
          second: z.number(),
          proof_hex: z.array(z.string()),
        }),
      ]),
    )
    .min(10),
});
const Accumulated = z.object({ vectors: z.array(z.object({ name: z.string(), sha256: z.string() })) });

describe("Merkle hashes against RFC 9162 and the published Certificate Transparency vectors", () => {
  test("hashes a leaf of no bytes, and the leaf L123456", () => {
    expect(toHex(leafHash(new Uint8Array(0), sha256))).toBe(
      "6e340b9cffb37a989ca544e6bb780a2c78901d3fb33738768511a30617afa01d",
    );
    expect(toHex(leafHash(utf8("L123456"), sha256))).toBe(
      "395aa064aa4c29f7010acfe3f25db9485bbd4b91897b6ad7ad547639252b4d56",
    );
  });

  test("hashes the node over N123 and N456", () => {
    expect(toHex(nodeHash(utf8("N123"), utf8("N456"), sha256))).toBe(
      "aa217fe888e47007fa15edab33c2b492a722cb106c64667fc2b044444de66bbb",
    );
  });

  test("gives the published root at each size from 0 to 8, grown leaf by leaf", () => {
    let frontier = EMPTY_FRONTIER;
    expect(toHex(frontierRoot(frontier, sha256))).toBe(ROOTS_HEX[0]);
    for (const [i, leaf] of leaves.entries()) {
      frontier = appendLeaf(frontier, leaf, sha256);
      expect(toHex(frontierRoot(frontier, sha256))).toBe(ROOTS_HEX[i + 1]);
      expect(toHex(rootOf(leaves.slice(0, i + 1), sha256))).toBe(ROOTS_HEX[i + 1]);
    }
  });

  test("builds the known proofs of the eight leaves", () => {
    const text = readShared("reference/vectors/merkle/proofs-8-leaves.json");
    if (text === undefined) return;
    const read = nodesOf(leaves, sha256);
    for (const known of EightLeafProofs.parse(JSON.parse(text)).cases) {
      const plan =
        known.kind === "inclusion"
          ? inclusionPlan(known.index, known.size)
          : consistencyPlan(known.first, known.second);
      expect(assembleProof(plan, read, sha256).map(toHex), JSON.stringify(known)).toEqual(known.proof_hex);
    }
  });
});

describe("proof verification against the published good and bad proofs", () => {
  test("takes every good inclusion proof and refuses every broken one", () => {
    const text = readShared("reference/vectors/merkle/inclusion.json");
    if (text === undefined) return;
    for (const { name, leafIdx, treeSize, root, leafHash: leaf, proof, wantErr } of Inclusion.parse(
      JSON.parse(text),
    ).cases) {
      const outcome = verifyInclusion({ index: leafIdx, size: treeSize, leaf, root, proof }, sha256);
      expect(outcome.ok, name).toBe(!wantErr);
    }
  });

  test("takes every good consistency proof and refuses every broken one", () => {
    const text = readShared("reference/vectors/merkle/consistency.json");
    if (text === undefined) return;
    for (const { name, wantErr, ...claim } of Consistency.parse(JSON.parse(text)).cases) {
      expect(verifyConsistency(claim, sha256).ok, name).toBe(!wantErr);
    }
  });
});

describe("all proofs of all trees up to 130 leaves", () => {
  const many = Array.from({ length: 130 }, (_, i) => leafHash(Uint8Array.of(i), sha256));
  const read = nodesOf(many, sha256);

  function accumulated(name: string, lines: (write: (line: string) => void) => void): void {
    const text = readShared("reference/vectors/merkle/accumulated.json");
    if (text === undefined) return;
    const known = Accumulated.parse(JSON.parse(text)).vectors.find((vector) => vector.name === name);
    const sum = createHash("sha256");
    lines((line) => sum.update(`${line}\n`));
    expect(sum.digest("hex")).toBe(known?.sha256);
  }
  const line = (prefix: string, hashes: Uint8Array[]): string => [prefix, ...hashes.map(toHex)].join(" ");

  test("inclusion proofs have the known accumulated hash", () => {
    accumulated("plain inclusion proofs", (write) => {
      for (let n = 1; n <= 130; n++) {
        for (let i = 0; i < n; i++)
          write(line(`${i} ${n}`, assembleProof(inclusionPlan(i, n), read, sha256)));
      }
    });
  });

  test("consistency proofs have the known accumulated hash", () => {
    accumulated("plain consistency proofs", (write) => {
      for (let n = 1; n <= 130; n++) {
        for (let m = 1; m <= n; m++)
          write(line(`${m} ${n}`, assembleProof(consistencyPlan(m, n), read, sha256)));
      }
    });
  });
});
