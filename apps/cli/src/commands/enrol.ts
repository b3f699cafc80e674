import { text } from "node:stream/consumers";
import { getMe } from "@beadroll/domain/contract/session.contract";
import type { Me } from "@beadroll/domain/schemas/session";
import { EXIT } from "../exit-codes.ts";
import { checkProfile, type Profile, profilePath, saveProfile } from "../home/profile.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { asking, clientOf } from "../server-client.ts";

/** What a cell's computer needs to be allowed. */
const NEEDED = ["scans:write", "passes:write", "records:read"] as const;

function warnings({ server }: Profile, { permissions }: Me): string[] {
  const { protocol, hostname } = new URL(server);
  const isLocal = /^(localhost|127\.\d+\.\d+\.\d+|\[::1\])$/.test(hostname);
  const missing = NEEDED.filter((needed) => !permissions.includes(needed));
  return [
    ...(protocol === "http:" && !isLocal
      ? ["The key and all results travel unencrypted to this address; prefer https."]
      : []),
    ...(missing.length > 0 ? [`This key lacks ${missing.join(", ")}: a cell's computer needs them.`] : []),
  ];
}

/** Checks the key with the server and keeps both. A key `-` is read from standard input. */
export async function enrol(options: {
  readonly server: string;
  readonly key: string;
}): Promise<CommandOutcome> {
  const key = options.key === "-" ? (await text(process.stdin)).trim() : options.key;
  const profile = checkProfile({ server: options.server, key }, { server: "--server", key: "--key" });
  const me = await asking(() => clientOf(profile).call(getMe, {}));
  await saveProfile(profile);
  const { name, permissions, cell_tag } = me;
  return {
    exit: EXIT.done,
    json: { server: profile.server, name, permissions, cell_tag, profile: profilePath() },
    text: [
      `Enrolled with ${profile.server} as ${name}${cell_tag === null ? "" : `, cell ${cell_tag}`}.`,
      `May: ${permissions.join(", ")}`,
      `Kept in ${profilePath()}`,
    ].join("\n"),
    talk: warnings(profile, me).join("\n"),
  };
}
