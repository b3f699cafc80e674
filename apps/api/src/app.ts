import { randomUUID } from "node:crypto";
import cookieParser from "cookie-parser";
import express, { type Express, type RequestHandler, Router } from "express";
import helmet from "helmet";
import swaggerUi from "swagger-ui-express";
import { authenticator } from "./auth/authenticate.ts";
import type { Deps } from "./deps.ts";
import { docsPages } from "./http/docs-pages.ts";
import { errorHandler } from "./http/error-handler.ts";
import { openApiDocument } from "./http/openapi.ts";
import { apiLimit, signInLimit } from "./http/rate-limit.ts";
import { refusal } from "./http/refusal.ts";
import { registerRoutes } from "./http/register.ts";
import { webApp } from "./http/web-app.ts";
import { allRoutes } from "./routes.ts";

/** Folders that the server serves beside the API. */
export interface ServedFolders {
  readonly web: string;
  readonly docs: string;
}

/** What tests ask of the server beside serving. */
export interface AppOptions {
  /** Hold every answer and refusal to its contract. */
  readonly check_answers?: boolean;
}

const requestId: RequestHandler = (_req, res, next) => {
  const id = randomUUID();
  res.locals["request_id"] = id;
  res.set("X-Request-Id", id);
  next();
};

/** Only what is ours runs in a page; the API docs' own page needs its inline style. */
const protections = (publicUrl: string): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", "data:", "blob:"],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        frameSrc: ["'self'", "blob:"],
        objectSrc: ["'none'"],
        frameAncestors: ["'self'"],
        upgradeInsecureRequests: null,
      },
    },
    strictTransportSecurity: publicUrl.startsWith("https:"),
    crossOriginEmbedderPolicy: false,
  });

/** Puts the server together: everything it needs is passed in, nothing is imported for its state. */
export function createApp(deps: Deps, folders: ServedFolders, options: AppOptions = {}): Express {
  const routes = allRoutes(deps);
  const document = openApiDocument(
    routes.map((route) => route.contract),
    deps.public_url,
  );
  const authenticate = authenticator(deps.db.reader, deps.secret, deps.now);
  const app = express();
  app.disable("x-powered-by");
  app.set("query parser", "simple");
  app.use(requestId, protections(deps.public_url));

  const api = Router();
  api.use(apiLimit());
  api.post("/session", signInLimit());
  api.use(cookieParser());
  api.get("/openapi.json", (_req, res) => res.json(document));
  api.use(
    registerRoutes(routes, {
      authenticate,
      store: deps.store,
      reader: deps.db.reader,
      check_answers: options.check_answers ?? false,
    }),
  );
  api.use((req) => {
    throw refusal("not-found", `There is no ${req.method} ${req.baseUrl}${req.path}.`);
  });
  app.use("/api/v1", api);
  app.get("/api", (_req, res) => res.redirect("/api/docs"));
  app.use(
    "/api/docs",
    swaggerUi.serve,
    swaggerUi.setup(undefined, { swaggerOptions: { url: "/api/v1/openapi.json" } }),
  );
  app.use("/docs", docsPages(folders.docs));
  app.get("/health", (_req, res) => res.json({ ok: true }));
  app.use("/api", () => {
    throw refusal("not-found", "The API is under /api/v1.");
  });
  app.use(webApp(folders.web));
  app.use(errorHandler(deps.log));
  return app;
}
