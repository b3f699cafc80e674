import { randomBytes } from "node:crypto";
import { existsSync } from "node:fs";
import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";

/** The secret that signs access tokens: made at the first start and kept outside the database, readable by us alone. */
export async function signingSecret(dataDir: string): Promise<string> {
  const path = join(dataDir, "signing-secret");
  if (!existsSync(path))
    await writeFile(path, randomBytes(48).toString("base64url"), { mode: 0o600, flag: "wx" });
  return readFile(path, "utf8");
}
