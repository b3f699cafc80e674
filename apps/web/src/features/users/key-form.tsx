import { KEY_SCOPES, type KeyScope } from "@beadroll/domain/auth/permissions";
import type { Cell } from "@beadroll/domain/schemas/cell";
import { ApiKeyCreate, type ApiKeyMade } from "@beadroll/domain/schemas/user";
import { type ReactElement, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { CheckField } from "../../kit/fields/check-field.tsx";
import { SelectField } from "../../kit/fields/select-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { TagText } from "../../kit/page/tag-text.tsx";
import { useCreateKey } from "./users.mutations.ts";

const Fields = ApiKeyCreate.pick({ name: true, cell_id: true });
const CELL_PC: readonly KeyScope[] = ["records:read", "scans:write", "passes:write", "mounts:write"];

/** The secret of a new key, shown this once. */
function Secret(props: { made: ApiKeyMade; onDone: () => void }): ReactElement {
  return (
    <div className="grid gap-3" role="status">
      <p>
        The key of <strong>{props.made.name}</strong>. Copy it now: it is stored hashed and cannot be shown
        again.
      </p>
      <p className="break-all">
        <TagText text={props.made.secret} copy />
      </p>
      <div>
        <Button kind="primary" onClick={props.onDone}>
          I have it
        </Button>
      </div>
    </div>
  );
}

/** Makes a machine's key. */
export function KeyForm(props: { cells: readonly Cell[] }): ReactElement {
  const [scopes, setScopes] = useState<readonly KeyScope[]>(CELL_PC);
  const [made, setMade] = useState<ApiKeyMade | null>(null);
  const create = useCreateKey();
  const form = useForm({
    schema: Fields,
    onSubmit: async (fields) => {
      if (scopes.length === 0) return;
      setMade(await create.mutateAsync({ ...fields, scopes: [...scopes] }));
      form.startAnew();
    },
  });
  if (made !== null) return <Secret made={made} onDone={() => setMade(null)} />;
  const toggle = (scope: KeyScope, held: boolean) =>
    setScopes(held ? [...scopes, scope] : scopes.filter((each) => each !== scope));
  return (
    <Form form={form} action="Make the key">
      <TextField {...form.text("name")} label="What it is for" />
      <SelectField
        {...form.choice(
          "cell_id",
          props.cells.map((cell) => cell.id),
        )}
        label="Cell it stands in"
        prompt="No cell"
        options={props.cells.map((cell) => ({ value: cell.id, label: cell.name }))}
      />
      <fieldset className="grid gap-2">
        <legend className="mb-1 font-semibold">What it may do</legend>
        {KEY_SCOPES.map((scope) => (
          <CheckField
            key={scope}
            label={scope}
            name={`scope-${scope}`}
            value={scopes.includes(scope)}
            onChange={(held) => toggle(scope, held)}
          />
        ))}
        {scopes.length === 0 ? <p className="text-stop">Choose one at least.</p> : null}
      </fieldset>
    </Form>
  );
}
