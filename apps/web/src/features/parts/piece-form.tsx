import { PieceCreate } from "@beadroll/domain/schemas/part";
import type { ReactElement } from "react";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { useAddPiece } from "./parts.mutations.ts";

/** A piece is built into the part; one at the same position is replaced, and stays on the record. */
export function PieceForm(props: { tag: string }): ReactElement {
  const add = useAddPiece(props.tag);
  const form = useForm({
    schema: PieceCreate,
    start: {},
    draft: `piece-${props.tag}`,
    onSubmit: async (fields) => {
      const piece = await add.mutateAsync(fields);
      toast(`${piece.position}: ${piece.lot_number}`, "good");
      form.startAnew();
    },
  });
  return (
    <Form form={form} action="Build it in">
      <TextField {...form.text("position")} label="What it is in the part" placeholder="Web plate" />
      <TextField {...form.text("lot_tag")} label="Tag of its lot" code placeholder="L-…" />
    </Form>
  );
}
