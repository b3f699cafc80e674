import type { Logger } from "pino";
import type { Caller } from "./auth/caller.ts";
import type { Database } from "./db/database.ts";
import type { FileStore } from "./files/file-store.ts";
import type { Once } from "./http/idempotency.ts";
import type { ChangeContext } from "./ledger/change.ts";
import type { MeasurePool } from "./measure/measure-pool.ts";

/** What services are made of; put together once, in app.ts, and passed in. */
export interface Deps {
  readonly db: Database;
  readonly store: FileStore;
  readonly measure: MeasurePool;
  readonly now: () => Date;
  readonly secret: string;
  readonly public_url: string;
  readonly log: Logger;
}

/** Who changes, when, and under which key, for {@link change}. */
export function changeContext(deps: Deps, by: { caller: Caller; once: Once | null }): ChangeContext {
  return { writer: deps.db.writer, now: deps.now, caller: by.caller, once: by.once };
}
