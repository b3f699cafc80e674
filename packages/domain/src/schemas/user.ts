import { z } from "zod";
import { KEY_SCOPES, ROLES } from "../auth/permissions.ts";
import { id, instant, line, version } from "./quantities.ts";

const userFields = {
  login: line("Sign-in name", "i.varga", 60),
  name: line("Name", "Ilka Varga"),
  roles: z
    .array(z.enum(ROLES))
    .min(1)
    .meta({ description: "Roles held", example: ["operator"] }),
  person_id: id("The person behind the account").nullable(),
};

/** An account for a person. */
export const User = z
  .object({
    id: id("User"),
    ...userFields,
    disabled_at: instant("When the account was closed").nullable(),
    created_at: instant("When it was made"),
    version,
  })
  .meta({ id: "User" });
export type User = z.infer<typeof User>;

/** A new account. Ten characters at least, as length beats rules (NIST SP 800-63B). */
export const UserCreate = z
  .strictObject({
    ...userFields,
    person_id: userFields.person_id.optional(),
    password: z
      .string()
      .min(10)
      .max(200)
      .meta({ description: "First password, 10 characters or more", example: "four-dull-words-here" }),
  })
  .meta({ id: "UserCreate" });
export type UserCreate = z.infer<typeof UserCreate>;

/** A machine's key, without its secret. */
export const ApiKey = z
  .object({
    id: id("Key"),
    name: line("What the key is for", "Cell 2 PC"),
    prefix: z.string().meta({ description: "First characters, to tell keys apart", example: "brk_7Q2M" }),
    scopes: z.array(z.enum(KEY_SCOPES)).meta({ description: "What the key may do" }),
    cell_id: id("The cell it stands in").nullable(),
    created_at: instant("When it was made"),
    last_used_at: instant("When it was last used").nullable(),
    revoked_at: instant("When it was withdrawn").nullable(),
  })
  .meta({ id: "ApiKey" });
export type ApiKey = z.infer<typeof ApiKey>;

/** A new machine's key. */
export const ApiKeyCreate = z
  .strictObject({
    name: line("What the key is for", "Cell 2 PC"),
    scopes: z
      .array(z.enum(KEY_SCOPES))
      .min(1)
      .meta({ description: "What the key may do", example: ["scans:write"] }),
    cell_id: id("The cell it stands in").nullable().optional(),
  })
  .meta({ id: "ApiKeyCreate" });
export type ApiKeyCreate = z.infer<typeof ApiKeyCreate>;

/** A new key with its secret, shown this once. */
export const ApiKeyMade = ApiKey.extend({
  secret: z.string().meta({ description: "The key itself; it is stored hashed and cannot be shown again" }),
}).meta({ id: "ApiKeyMade" });
export type ApiKeyMade = z.infer<typeof ApiKeyMade>;
