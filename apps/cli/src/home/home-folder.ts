import { homedir } from "node:os";
import { join } from "node:path";

/** The folder of profile and queue: BEADROLL_HOME, else the user's configuration folder. */
export function homeFolder(): string {
  const { BEADROLL_HOME, XDG_CONFIG_HOME } = process.env;
  return BEADROLL_HOME || join(XDG_CONFIG_HOME || join(homedir(), ".config"), "beadroll");
}
