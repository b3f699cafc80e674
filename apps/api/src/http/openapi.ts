import { OpenAPIRegistry, OpenApiGeneratorV31, type RouteConfig } from "@asteasolutions/zod-to-openapi";
import type { Contract, ContractBody } from "@beadroll/domain/contract/contract";
import { FAULT_KINDS, type FaultCode } from "@beadroll/domain/faults/codes";
import { Problem } from "@beadroll/domain/schemas/problem";
import { z } from "zod";
import { problemsOf } from "./contract-problems.ts";

type Responses = RouteConfig["responses"];

/** One answer a status, naming the kinds of problem behind it. */
function problemResponses(contract: Contract): Responses {
  const byStatus = new Map<number, FaultCode[]>();
  for (const code of problemsOf(contract)) {
    const { status } = FAULT_KINDS[code];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  const entries = [...byStatus]
    .sort(([a], [b]) => a - b)
    .map(([status, codes]) => [
      String(status),
      {
        description: codes.map((code) => `${FAULT_KINDS[code].title} (\`${code}\`)`).join("; "),
        content: { "application/problem+json": { schema: Problem } },
      },
    ]);
  return Object.fromEntries(entries);
}

function answerResponse({ answer }: Contract): Responses {
  const { description } = answer;
  if (answer.status === 204) return { "204": { description } };
  if ("media_type" in answer) {
    const schema = z.string().meta({ format: "binary", description: "The bytes" });
    return { [answer.status]: { description, content: { [answer.media_type]: { schema } } } };
  }
  return { [answer.status]: { description, content: { "application/json": { schema: answer.schema } } } };
}

function multipartSchema(body: Extract<ContractBody, { kind: "multipart" }>): z.ZodType {
  const fields = body.schema instanceof z.ZodObject ? body.schema.shape : {};
  const files = Object.entries(body.files).map(([name, part]) => {
    const file = z
      .string()
      .meta({ format: "binary", description: `${part.description}; ${part.max_bytes} bytes at most` });
    return [name, part.required ? file : file.optional()];
  });
  return z.object({ ...fields, ...Object.fromEntries(files) });
}

function requestBody(contract: Contract): NonNullable<RouteConfig["request"]>["body"] {
  if (!contract.body) return undefined;
  if (contract.body.kind === "json")
    return { required: true, content: { "application/json": { schema: contract.body.schema } } };
  return { required: true, content: { "multipart/form-data": { schema: multipartSchema(contract.body) } } };
}

const GUARD_HEADERS = {
  "idempotency-key": z.object({
    "Idempotency-Key": z.string().min(8).max(200).meta({
      description: "Unique for this record; the same key and body again give the first answer",
      example: "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77",
    }),
  }),
  "if-match": z.object({ "If-Match": z.string().meta({ description: "The ETag you read", example: '"3"' }) }),
} as const;

function toRouteConfig(contract: Contract): RouteConfig {
  const body = requestBody(contract);
  const open = contract.access === "open";
  return {
    method: contract.method,
    path: contract.path,
    operationId: contract.operationId,
    summary: contract.summary,
    description: [
      contract.description,
      open
        ? "Open to all."
        : contract.access === "signed-in"
          ? "For all who are signed in."
          : `Needs \`${contract.access}\`.`,
    ]
      .filter(Boolean)
      .join("\n\n"),
    tags: [contract.group],
    security: open ? [] : [{ person: [] }, { machine: [] }],
    request: {
      ...(contract.params && { params: contract.params }),
      ...(contract.query && { query: contract.query }),
      ...(contract.guard && { headers: GUARD_HEADERS[contract.guard] }),
      ...(body && { body }),
    },
    responses: { ...answerResponse(contract), ...problemResponses(contract) },
  };
}

/** The OpenAPI 3.1 document of the contracts that are served. */
export function openApiDocument(
  contracts: readonly Contract[],
  publicUrl: string,
): ReturnType<OpenApiGeneratorV31["generateDocument"]> {
  const registry = new OpenAPIRegistry();
  registry.registerComponent("securitySchemes", "person", {
    type: "http",
    scheme: "bearer",
    bearerFormat: "JWT",
    description: "A person's access token, from `POST /session`.",
  });
  registry.registerComponent("securitySchemes", "machine", {
    type: "http",
    scheme: "bearer",
    description: "A machine's key, made under Users and keys.",
  });
  for (const contract of contracts) registry.registerPath(toRouteConfig(contract));
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Beadroll",
      version: "1.0.0",
      description:
        "Every robot-welded seam, on the record. The server records and advises; it is no safety function and replaces no guard, interlock or judgement.",
    },
    servers: [{ url: `${publicUrl}/api/v1` }],
  });
}
