import { z } from "zod";
import { day, id, instant, line, version } from "./quantities.ts";

/** A person of the shop, known by the badge. */
export const Person = z
  .object({
    id: id("Person"),
    tag: z.string().meta({ description: "Badge", example: "W-8K3F7Q2NF" }),
    name: line("Name", "Ilka Varga"),
    job: line("Job", "Welding operator"),
    active: z.boolean().meta({ description: "Works here now" }),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Person" });
export type Person = z.infer<typeof Person>;

/** A new person. */
export const PersonCreate = z
  .strictObject({ name: Person.shape.name, job: Person.shape.job })
  .meta({ id: "PersonCreate" });
export type PersonCreate = z.infer<typeof PersonCreate>;

/** A right to weld, with its range. */
export const Qualification = z
  .object({
    id: id("Qualification"),
    person_id: id("Person"),
    standard: z.enum(["ISO 14732", "ISO 9606-1"]).meta({ description: "Standard it was given under" }),
    number: line("Certificate number", "Q-2214"),
    process: line("Process number, ISO 4063", "135", 8),
    range: line("Range of qualification", "Robot, multi-run, t 3 to 24 mm"),
    issued_on: day("Date of issue"),
    valid_until: day("Last day of validity"),
  })
  .meta({ id: "Qualification" });
export type Qualification = z.infer<typeof Qualification>;

/** A new qualification of a person. */
export const QualificationCreate = z
  .strictObject(Qualification.omit({ id: true, person_id: true }).shape)
  .meta({ id: "QualificationCreate" });
export type QualificationCreate = z.infer<typeof QualificationCreate>;

/** A person with their qualifications. */
export const PersonPage = Person.extend({
  qualifications: z.array(Qualification).meta({ description: "Latest first" }),
}).meta({ id: "PersonPage" });
export type PersonPage = z.infer<typeof PersonPage>;
