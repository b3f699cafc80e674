import { z } from "zod";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { Person, PersonCreate, PersonPage, Qualification, QualificationCreate } from "../schemas/person.ts";
import { contract } from "./contract.ts";
import { TagParams } from "./parameters.ts";

const group = "People";

export const listPeople = contract({
  method: "get",
  path: "/people",
  operationId: "listPeople",
  summary: "People, by name",
  group,
  access: "records:read",
  query: z.strictObject(PageQuery),
  answer: { status: 200, description: "A page of people", schema: pageOf(Person) },
  problems: ["parameter-unknown"],
});

export const createPerson = contract({
  method: "post",
  path: "/people",
  operationId: "createPerson",
  summary: "Record a person and mint the badge's tag",
  group,
  access: "people:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: PersonCreate },
  answer: { status: 201, description: "The person", schema: Person },
  problems: ["request-invalid"],
});

export const getPerson = contract({
  method: "get",
  path: "/people/{tag}",
  operationId: "getPerson",
  summary: "A person with their qualifications",
  group,
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "The person", schema: PersonPage },
  problems: ["tag-invalid", "not-found"],
});

export const addQualification = contract({
  method: "post",
  path: "/people/{tag}/qualifications",
  operationId: "addQualification",
  summary: "Record a qualification of a person",
  group,
  access: "people:write",
  guard: "idempotency-key",
  params: TagParams,
  body: { kind: "json", schema: QualificationCreate },
  answer: { status: 201, description: "The qualification", schema: Qualification },
  problems: ["request-invalid", "tag-invalid", "not-found", "conflict"],
});
