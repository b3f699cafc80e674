import { createReadStream, existsSync, statSync } from "node:fs";
import { createServer, type Server } from "node:http";
import { extname, join, normalize, sep } from "node:path";

const KINDS: Record<string, string> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".css": "text/css; charset=utf-8",
  ".svg": "image/svg+xml",
  ".woff2": "font/woff2",
  ".woff": "font/woff",
};

/** As strict as the product's own: nothing inline, nothing from elsewhere. */
const CONTENT_POLICY = "default-src 'self'; object-src 'none'; base-uri 'none'; frame-ancestors 'none'";

/** A built web application on a free port of 127.0.0.1; addresses without a file get index.html. */
export interface StaticSite {
  readonly url: string;
  close(): Promise<void>;
}

/** Serves a folder until it is closed. */
export async function serveFolder(folder: string): Promise<StaticSite> {
  const server = createServer((request, response) => {
    const { pathname } = new URL(request.url ?? "/", "http://127.0.0.1");
    const file = fileFor(folder, pathname);
    response.writeHead(200, {
      "content-type": KINDS[extname(file)] ?? "application/octet-stream",
      "content-security-policy": CONTENT_POLICY,
    });
    createReadStream(file).pipe(response);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return { url: `http://127.0.0.1:${portOf(server)}`, close: () => closeServer(server) };
}

function fileFor(folder: string, pathname: string): string {
  const file = normalize(join(folder, pathname));
  const isInside = file.startsWith(folder.endsWith(sep) ? folder : folder + sep);
  return isInside && existsSync(file) && statSync(file).isFile() ? file : join(folder, "index.html");
}

function portOf(server: Server): number {
  const address = server.address();
  if (address === null || typeof address === "string") throw new TypeError("server: expected a port");
  return address.port;
}

function closeServer(server: Server): Promise<void> {
  server.closeAllConnections();
  return new Promise((resolve, reject) => server.close((error) => (error ? reject(error) : resolve())));
}
