import { z } from "zod";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { ApiKey, ApiKeyCreate, ApiKeyMade, User, UserCreate } from "../schemas/user.ts";
import { contract } from "./contract.ts";
import { IdParams } from "./parameters.ts";

export const listUsers = contract({
  method: "get",
  path: "/users",
  operationId: "listUsers",
  summary: "Accounts, by sign-in name",
  group: "Users and keys",
  access: "users:manage",
  query: z.strictObject(PageQuery),
  answer: { status: 200, description: "A page of accounts", schema: pageOf(User) },
  problems: ["parameter-unknown"],
});

export const createUser = contract({
  method: "post",
  path: "/users",
  operationId: "createUser",
  summary: "Make an account",
  group: "Users and keys",
  access: "users:manage",
  guard: "idempotency-key",
  body: { kind: "json", schema: UserCreate },
  answer: { status: 201, description: "The account", schema: User },
  problems: ["request-invalid", "conflict"],
});

export const listKeys = contract({
  method: "get",
  path: "/keys",
  operationId: "listKeys",
  summary: "Machine keys, newest first",
  group: "Users and keys",
  access: "keys:manage",
  query: z.strictObject(PageQuery),
  answer: { status: 200, description: "A page of keys, without their secrets", schema: pageOf(ApiKey) },
  problems: ["parameter-unknown"],
});

export const createKey = contract({
  method: "post",
  path: "/keys",
  operationId: "createKey",
  summary: "Make a machine's key; the secret is shown this once",
  group: "Users and keys",
  access: "keys:manage",
  body: { kind: "json", schema: ApiKeyCreate },
  answer: { status: 201, description: "The key with its secret", schema: ApiKeyMade },
  problems: ["request-invalid"],
});

export const revokeKey = contract({
  method: "delete",
  path: "/keys/{id}",
  operationId: "revokeKey",
  summary: "Withdraw a machine's key",
  group: "Users and keys",
  access: "keys:manage",
  params: IdParams,
  answer: { status: 204, description: "Withdrawn" },
  problems: ["not-found", "state-conflict"],
});
