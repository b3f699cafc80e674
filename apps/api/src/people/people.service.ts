import type {
  Person,
  PersonCreate,
  PersonPage,
  Qualification,
  QualificationCreate,
} from "@beadroll/domain/schemas/person";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { type Page, pageOf } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { tagOf } from "../tags/tag-lookup.ts";

type PersonRow = Omit<Person, "active"> & { readonly active: number };

const COLUMNS = [
  "people.id",
  "people.tag",
  "people.name",
  "people.job",
  "people.active",
  "people.created_at",
  "people.version",
];

const toPerson = (row: PersonRow): Person => ({
  id: row.id,
  tag: row.tag,
  name: row.name,
  job: row.job,
  active: row.active === 1,
  created_at: row.created_at,
  version: row.version,
});

/** A person by the badge. @throws Refusal tag-invalid, not-found */
export async function readPerson(db: Knex, tagText: string): Promise<Person> {
  const tag = tagOf("W", tagText);
  const row: PersonRow | undefined = await db("people").where({ tag }).first(COLUMNS);
  if (row === undefined) throw refusal("not-found", `Nobody here has the badge ${tag}.`);
  return toPerson(row);
}

async function readQualifications(db: Knex, personId: string): Promise<Qualification[]> {
  return db("qualifications")
    .where({ person_id: personId })
    .orderBy("issued_on", "desc")
    .select("id", "person_id", "standard", "number", "process", "range", "issued_on", "valid_until");
}

/** A person with their qualifications. @throws Refusal tag-invalid, not-found */
export async function readPersonPage(db: Knex, tag: string): Promise<PersonPage> {
  const person = await readPerson(db, tag);
  return { ...person, qualifications: await readQualifications(db, person.id) };
}

/** People by name. */
export async function listPeople(db: Knex, request: PageRequest): Promise<Page<Person>> {
  const keyset = { columns: ["people.name", "people.id"], descending: false };
  return pageOf(await readPage<PersonRow>(db("people").select(COLUMNS), keyset, request), toPerson);
}

/** Records a person and mints the badge's tag. */
export function createPerson(context: ChangeContext, create: PersonCreate): Promise<Person> {
  return change(context, "person.create", async (trx) => {
    const tag = trx.newTag("W");
    await trx.insert("people", {
      id: trx.newId(),
      tag,
      ...create,
      active: 1,
      created_at: trx.at,
      version: 1,
    });
    return { value: await readPerson(trx.read, tag), subjects: [tag] };
  });
}

/** Records a qualification. @throws Refusal request-invalid when it ends before it begins, conflict, not-found */
export function addQualification(
  context: ChangeContext,
  tag: string,
  create: QualificationCreate,
): Promise<Qualification> {
  return change(context, "qualification.create", async (trx) => {
    const person = await readPerson(trx.read, tag);
    if (create.valid_until < create.issued_on)
      throw refusal("request-invalid", "valid_until: it must not end before it was issued.", {
        pointer: "/valid_until",
        field: "valid_until",
      });
    const { standard, number } = create;
    const twin: unknown = await trx.read("qualifications").where({ standard, number }).first("id");
    if (twin !== undefined)
      throw refusal("conflict", `${standard} certificate ${number} is already recorded.`, {
        field: "number",
      });
    const qualification = { id: trx.newId(), person_id: person.id, ...create };
    await trx.insert("qualifications", { ...qualification, created_at: trx.at });
    return { value: qualification, subjects: [person.tag] };
  });
}
