import { z } from "zod";
import { PERMISSIONS, ROLES } from "../auth/permissions.ts";
import { id, line } from "./quantities.ts";

/** Name and password. */
export const SignIn = z
  .strictObject({
    login: line("Sign-in name", "i.varga"),
    password: z.string().min(1).max(200).meta({ description: "Password", example: "straw-bronze-purple" }),
  })
  .meta({ id: "SignIn" });

/** Who is signed in and what they may do. */
export const Account = z
  .object({
    user_id: id("User"),
    login: line("Sign-in name", "i.varga"),
    name: line("Name", "Ilka Varga"),
    roles: z.array(z.enum(ROLES)).meta({ description: "Roles held" }),
    permissions: z.array(z.enum(PERMISSIONS)).meta({ description: "What these roles allow" }),
    person_tag: z
      .string()
      .nullable()
      .meta({ description: "Badge of the person behind the account", example: "W-8K3F7Q2NF" }),
  })
  .meta({ id: "Account" });
export type Account = z.infer<typeof Account>;

/** A signed-in session: the access token goes into the Authorization header. */
export const Session = z
  .object({
    access_token: z.string().meta({ description: "JWT, valid for `expires_in_s`" }),
    expires_in_s: z.int().meta({ description: "Seconds until the token ends", example: 600 }),
    account: Account,
  })
  .meta({ id: "Session" });
export type Session = z.infer<typeof Session>;

/** Who asks, for people and machines alike. */
export const Me = z
  .object({
    kind: z.enum(["person", "machine"]).meta({ description: "A signed-in person or a machine's key" }),
    name: z.string().meta({ description: "Name of the user or key" }),
    permissions: z.array(z.enum(PERMISSIONS)).meta({ description: "What is allowed" }),
    cell_tag: z
      .string()
      .nullable()
      .meta({ description: "The cell a key belongs to", example: "C-8K3F7Q2N6" }),
    account: Account.nullable().meta({ description: "The account, for people" }),
  })
  .meta({ id: "Me" });
export type Me = z.infer<typeof Me>;
