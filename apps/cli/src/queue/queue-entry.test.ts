import { describe, expect, it } from "vitest";
import {
  contentDigest,
  DamagedEntry,
  decodeEntry,
  encodeEntry,
  type QueueEntry,
  requestKey,
} from "./queue-entry.ts";

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

const anEntry = (fields: Partial<QueueEntry> = {}): QueueEntry => ({
  kind: "scan",
  seam: "S-8K3F7Q2NS",
  fields: { stage: "fitup", units: "mm", taken_at: "2026-11-30T09:41:07.000Z" },
  files: [
    { part: "scan", name: "profiles.csv", bytes: bytes("station_mm,x_mm,z_mm\n0,1,2\n") },
    { part: "poses", name: "poses.csv", bytes: Uint8Array.of(0, 10, 13, 255) },
  ],
  queued_at: "2026-11-30T09:41:07.000Z",
  ...fields,
});

const encoded = (entry: QueueEntry): Uint8Array => Buffer.concat(encodeEntry(entry));

describe("an entry in its file", () => {
  it("comes back as it went in, whatever its bytes", () => {
    const back = decodeEntry(encoded(anEntry()));
    const plain = {
      ...back,
      files: back.files.map((file) => ({ ...file, bytes: Uint8Array.from(file.bytes) })),
    };
    expect(plain).toEqual(anEntry());
  });

  it("is refused whole when any byte of its files changed, is missing or was added", () => {
    const whole = encoded(anEntry());
    const filesFrom = whole.indexOf(10) + 1;
    for (let at = filesFrom; at < whole.length; at += 1) {
      const changed = Uint8Array.from(whole);
      changed[at] = (changed[at] ?? 0) ^ 1;
      expect(() => decodeEntry(changed)).toThrow(DamagedEntry);
    }
    for (let length = 0; length < whole.length; length += 1)
      expect(() => decodeEntry(whole.subarray(0, length))).toThrow(DamagedEntry);
    expect(() => decodeEntry(Buffer.concat([whole, bytes("x")]))).toThrow(DamagedEntry);
  });
});

describe("what makes two pushes the same result", () => {
  const digest = contentDigest(anEntry());

  it("is seam, kind, stage and bytes", () => {
    const [scan, poses] = anEntry().files;
    expect(contentDigest(anEntry({ seam: "S-8K3F7Q2NT" }))).not.toBe(digest);
    expect(contentDigest(anEntry({ kind: "pass" }))).not.toBe(digest);
    expect(contentDigest(anEntry({ fields: { stage: "bead" } }))).not.toBe(digest);
    expect(contentDigest(anEntry({ files: scan ? [scan] : [] }))).not.toBe(digest);
    const swapped = { part: "scan", name: "x", bytes: poses?.bytes ?? bytes("") };
    expect(contentDigest(anEntry({ files: poses ? [swapped, poses] : [] }))).not.toBe(digest);
  });

  it("is neither the time nor the names of the files", () => {
    const files = anEntry().files.map((file) => ({ ...file, name: `copy of ${file.name}` }));
    const fields = { ...anEntry().fields, taken_at: "2026-12-01T00:00:00.000Z" };
    expect(contentDigest(anEntry({ files, fields, queued_at: "2026-12-01T00:00:00.000Z" }))).toBe(digest);
  });
});

describe("the key of a request", () => {
  it("stays the same over attempts and differs with any field, which the server holds it to", () => {
    const key = requestKey(anEntry());
    expect(requestKey(decodeEntry(encoded(anEntry())))).toBe(key);
    expect(requestKey(anEntry({ queued_at: "2026-12-01T00:00:00.000Z" }))).toBe(key);
    expect(requestKey(anEntry({ fields: { ...anEntry().fields, units: "in" } }))).not.toBe(key);
    expect(key).toMatch(/^[0-9a-f]{64}$/);
  });
});
