import { ROLES, type Role } from "@beadroll/domain/auth/permissions";
import { UserCreate } from "@beadroll/domain/schemas/user";
import { type ReactElement, useState } from "react";
import { CheckField } from "../../kit/fields/check-field.tsx";
import { PasswordField } from "../../kit/fields/password-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { useCreateUser } from "./users.mutations.ts";

const Fields = UserCreate.pick({ login: true, name: true, password: true });

/** Makes an account for a person. */
export function UserForm(): ReactElement {
  const [roles, setRoles] = useState<readonly Role[]>([]);
  const [isTried, setTried] = useState(false);
  const create = useCreateUser();
  const form = useForm({
    schema: Fields,
    onSubmit: async (fields) => {
      setTried(true);
      if (roles.length === 0) return;
      const user = await create.mutateAsync({ ...fields, roles: [...roles] });
      toast(`Account ${user.login} made`, "good");
      setRoles([]);
      setTried(false);
      form.startAnew();
    },
  });
  const toggle = (role: Role, held: boolean) =>
    setRoles(held ? [...roles, role] : roles.filter((each) => each !== role));
  return (
    <Form form={form} action="Make the account">
      <TextField {...form.text("login")} label="Sign-in name" autoComplete="off" />
      <TextField {...form.text("name")} label="Name" autoComplete="off" />
      <PasswordField {...form.secret("password")} label="First password" autoComplete="new-password" />
      <fieldset className="grid gap-2">
        <legend className="mb-1 font-semibold">Roles</legend>
        {ROLES.map((role) => (
          <CheckField
            key={role}
            label={role}
            name={`role-${role}`}
            value={roles.includes(role)}
            onChange={(held) => toggle(role, held)}
          />
        ))}
        {isTried && roles.length === 0 ? <p className="text-stop">Choose one role at least.</p> : null}
      </fieldset>
    </Form>
  );
}
