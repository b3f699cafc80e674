import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { allRoutes } from "../routes.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

interface Operation {
  operationId: string;
  summary: string;
  responses: Record<string, unknown>;
}
interface Document {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, unknown> };
}

let server: TestServer;
let document: Document;
beforeAll(async () => {
  server = await startTestServer();
  document = (await server.http.get("/api/v1/openapi.json")).body;
});
afterAll(() => server.close());

const fields = (schema: unknown, path: string): string[] => {
  if (typeof schema !== "object" || schema === null) return [];
  const own =
    "properties" in schema && typeof schema.properties === "object" ? (schema.properties ?? {}) : {};
  return Object.entries(own).flatMap(([name, field]) => [
    ...(JSON.stringify(field).includes('"description"') || JSON.stringify(field).includes('"$ref"')
      ? []
      : [`${path}.${name}`]),
    ...fields(field, `${path}.${name}`),
  ]);
};

describe("the OpenAPI document", () => {
  it("is 3.1 and holds every route that is served, and no other", () => {
    expect(document.openapi).toMatch(/^3\.1/);
    const served = allRoutes(server.deps).map(
      ({ contract }) => `${contract.method} ${contract.path} ${contract.operationId}`,
    );
    const written = Object.entries(document.paths).flatMap(([path, methods]) =>
      Object.entries(methods).map(([method, operation]) => `${method} ${path} ${operation.operationId}`),
    );
    expect(written.sort()).toEqual(served.sort());
  });

  it("gives each operation a summary, an answer and its problems", () => {
    for (const methods of Object.values(document.paths)) {
      for (const operation of Object.values(methods)) {
        expect(operation.summary, operation.operationId).toBeTruthy();
        expect(Object.keys(operation.responses).some((status) => status.startsWith("2"))).toBe(true);
        expect(Object.keys(operation.responses)).toContain("429");
      }
    }
  });

  it("describes every field of every resource", () => {
    const bare = Object.entries(document.components.schemas).flatMap(([name, schema]) =>
      fields(schema, name),
    );
    expect(bare).toEqual([]);
  });

  it("is shown as pages, as are the problem types", async () => {
    const docs = await server.http.get("/api/docs/");
    expect([docs.status, docs.text.includes("swagger-ui")]).toEqual([200, true]);
    const problems = await server.http.get("/docs/api/problems");
    expect(problems.text).toContain('id="file-value-invalid"');
  });
});
