import { readFileSync } from "node:fs";
import { join } from "node:path";
import { z } from "zod";
import { EXIT } from "../exit-codes.ts";
import { stop } from "../output/outcome.ts";
import { homeFolder } from "./home-folder.ts";
import { isSystemError, writeWhole } from "./write-whole.ts";

const Server = z
  .url({ protocol: /^https?$/, error: "expected an address such as https://weld.example:8080" })
  .refine(
    (text) => !/[?#]/.test(text) && !/\/\/[^/]*@/.test(text),
    "expected an address without ?, # or a name in it",
  )
  .transform((text) => text.replace(/\/+$/, ""));

const Key = z.string().regex(/^[\x21-\x7e]+$/, "expected one word of plain characters, such as brk_…");

/** What this computer knows of its server. */
export const Profile = z.object({ server: Server, key: Key });
export type Profile = z.infer<typeof Profile>;

/** Where the profile is kept. */
export const profilePath = (): string => join(homeFolder(), "profile.json");

/** A profile from what a person or the environment gave. Stops with exit code 2, naming what is wrong. */
export function checkProfile(
  given: { server: string; key: string },
  names: { server: string; key: string },
): Profile {
  const parsed = Profile.safeParse(given);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map(
    ({ path, message }) => `${path[0] === "key" ? names.key : names.server}: ${message}`,
  );
  return stop(EXIT.usage, { error: "usage", detail: lines.join("; ") }, lines.join("\n"));
}

/** Keeps the profile, readable by this user alone. */
export function saveProfile(profile: Profile): Promise<void> {
  return writeWhole(profilePath(), new TextEncoder().encode(`${JSON.stringify(profile, null, 2)}\n`));
}

interface Kept {
  readonly server?: string | undefined;
  readonly key?: string | undefined;
}

function readKept(): Kept {
  try {
    const text = readFileSync(profilePath(), "utf8");
    return z.object({ server: z.string(), key: z.string() }).partial().parse(JSON.parse(text));
  } catch (error) {
    if (isSystemError(error) && error.code === "ENOENT") return {};
    const isDamaged = error instanceof SyntaxError || error instanceof z.ZodError || isSystemError(error);
    if (!isDamaged) throw error;
    const why = isSystemError(error) ? error.message : "it is no profile; run beadroll enrol again";
    return stop(EXIT.usage, { error: "profile-unreadable", detail: `${profilePath()}: ${why}` });
  }
}

/** The profile in force: BEADROLL_SERVER and BEADROLL_KEY before what `enrol` kept. Stops with exit code 40 without one. */
export function loadProfile(): Profile {
  const { BEADROLL_SERVER, BEADROLL_KEY } = process.env;
  const kept: Kept = BEADROLL_SERVER && BEADROLL_KEY ? {} : readKept();
  const server = BEADROLL_SERVER || kept.server;
  const key = BEADROLL_KEY || kept.key;
  if (!server || !key)
    return stop(EXIT.not_allowed, {
      error: "not-enrolled",
      detail: "This computer is not enrolled. Run: beadroll enrol --server URL --key KEY",
    });
  return checkProfile(
    { server, key },
    {
      server: BEADROLL_SERVER ? "BEADROLL_SERVER" : `${profilePath()}: server`,
      key: BEADROLL_KEY ? "BEADROLL_KEY" : `${profilePath()}: key`,
    },
  );
}
