import { sessionRoutes } from "./auth/session.routes.ts";
import { cellRoutes } from "./cells/cells.routes.ts";
import type { Deps } from "./deps.ts";
import { drawingRoutes } from "./drawings/drawings.routes.ts";
import { fileRoutes } from "./files/files.routes.ts";
import { findRoutes } from "./find/find.routes.ts";
import type { Route } from "./http/route.ts";
import { inspectionRoutes } from "./inspections/inspections.routes.ts";
import { ledgerRoutes } from "./ledger/ledger.routes.ts";
import { lotRoutes } from "./lots/lots.routes.ts";
import { partRoutes } from "./parts/parts.routes.ts";
import { passRoutes } from "./passes/passes.routes.ts";
import { peopleRoutes } from "./people/people.routes.ts";
import { procedureRoutes } from "./procedures/procedures.routes.ts";
import { scanRoutes } from "./scans/scans.routes.ts";
import { seamRoutes } from "./seams/seams.routes.ts";
import { userRoutes } from "./users/users.routes.ts";

/** Every operation that is served. */
export function allRoutes(deps: Deps): Route[] {
  const session = { ...deps.db, secret: deps.secret, now: deps.now };
  return [
    ...sessionRoutes(session, deps.public_url),
    ...cellRoutes(deps),
    ...partRoutes(deps),
    ...seamRoutes(deps),
    ...scanRoutes(deps),
    ...passRoutes(deps),
    ...inspectionRoutes(deps),
    ...lotRoutes(deps),
    ...drawingRoutes(deps),
    ...procedureRoutes(deps),
    ...peopleRoutes(deps),
    ...findRoutes(deps),
    ...fileRoutes(deps),
    ...ledgerRoutes(deps),
    ...userRoutes(deps),
  ];
}
