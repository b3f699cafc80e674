import { resolve } from "node:path";
import { z } from "zod";

const port = z.coerce.number().int().min(1).max(65535);
const blankIsAbsent = <T extends z.ZodType>(schema: T) =>
  z.preprocess((value) => (value === "" ? undefined : value), schema);

/** Settings, by environment; .env.example explains each. */
const Environment = z.object({
  BEADROLL_PORT: blankIsAbsent(port.default(8080)),
  BEADROLL_HOST: blankIsAbsent(z.string().default("127.0.0.1")),
  BEADROLL_PUBLIC_URL: blankIsAbsent(z.url({ protocol: /^https?$/ }).optional()),
  BEADROLL_DATA: blankIsAbsent(z.string().default("data")),
  BEADROLL_SECRET: blankIsAbsent(z.string().min(32, "32 characters or more").optional()),
  BEADROLL_WORKERS: blankIsAbsent(z.coerce.number().int().min(1).max(64).optional()),
  BEADROLL_LOG: blankIsAbsent(z.enum(["trace", "debug", "info", "warn", "error", "silent"]).default("info")),
  BEADROLL_SMTP_URL: blankIsAbsent(z.url({ protocol: /^smtps?$/ }).optional()),
});

/** The server's settings, checked. */
export interface Config {
  readonly port: number;
  readonly host: string;
  /** What labels and links begin with, no slash at the end. */
  readonly public_url: string;
  /** Folder of the database, files and secrets. */
  readonly data_dir: string;
  /** Signs access tokens; null means: keep one in the data folder. */
  readonly secret: string | null;
  readonly workers: number | null;
  readonly log_level: "trace" | "debug" | "info" | "warn" | "error" | "silent";
  readonly smtp_url: string | null;
}

/** Thrown at the start for settings that cannot be used; its message is the sentence to show. */
export class ConfigError extends Error {}

/**
 * Reads the settings from the environment.
 * @throws ConfigError with one sentence naming each wrong setting
 */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const parsed = Environment.safeParse(env);
  if (!parsed.success) {
    const wrong = parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
    throw new ConfigError(`The configuration cannot be used. ${wrong.join("; ")}.`);
  }
  const settings = parsed.data;
  return {
    port: settings.BEADROLL_PORT,
    host: settings.BEADROLL_HOST,
    public_url: (settings.BEADROLL_PUBLIC_URL ?? `http://localhost:${settings.BEADROLL_PORT}`).replace(
      /\/+$/,
      "",
    ),
    data_dir: resolve(settings.BEADROLL_DATA),
    secret: settings.BEADROLL_SECRET ?? null,
    workers: settings.BEADROLL_WORKERS ?? null,
    log_level: settings.BEADROLL_LOG,
    smtp_url: settings.BEADROLL_SMTP_URL ?? null,
  };
}
