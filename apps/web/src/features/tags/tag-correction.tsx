import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { type FormEvent, type ReactElement, useState } from "react";
import { useNavigate } from "react-router";
import { findPath, pathTo } from "../../app/paths.ts";
import { Button, ButtonLink } from "../../kit/actions/button.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";

/** A tag that was refused, with why, to be mended in place. */
export function TagCorrection(props: { typed: string; why: string }): ReactElement {
  const navigate = useNavigate();
  const [text, setText] = useState(props.typed);
  const [why, setWhy] = useState(props.why);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const tag = parseTag(text);
    if (tag.ok) void navigate(pathTo("tagDoor", { tag: tag.value }));
    else setWhy(tag.faults.map((fault) => fault.detail).join(" "));
  };
  return (
    <form className="grid gap-5" onSubmit={submit}>
      <TextField
        label="Tag"
        name="tag"
        value={text}
        onChange={setText}
        error={why}
        limit="Hyphens, case, O for 0 and I or L for 1 do not matter."
        code
      />
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary">
          Open the tag
        </Button>
        <ButtonLink to={findPath(props.typed)}>Search for it instead</ButtonLink>
      </div>
    </form>
  );
}
