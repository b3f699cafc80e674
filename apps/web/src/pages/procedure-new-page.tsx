import { ProcedureCreate, type ProcedureRanges } from "@beadroll/domain/schemas/procedure";
import type { ReactElement } from "react";
import { useNavigate } from "react-router";
import { z } from "zod";
import { PATHS, pathTo } from "../app/paths.ts";
import { useCreateProcedure } from "../features/procedures/procedures.mutations.ts";
import { rangeRows } from "../features/procedures/range-rows.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { NumberField } from "../kit/fields/number-field.tsx";
import { TextField } from "../kit/fields/text-field.tsx";
import { Form } from "../kit/forms/form.tsx";
import { useForm } from "../kit/forms/use-form.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { toast } from "../kit/states/announcements.ts";

const NO_RANGES: ProcedureRanges = {
  current_a: null,
  voltage_v: null,
  wire_feed_m_min: null,
  travel_mm_s: null,
  gas_l_min: null,
  heat_input_kj_mm: null,
  interpass_c: null,
};

/** On the form each end of a range may be left empty; a range with one end only is named as such. */
const bound = z.number().nullable().optional();
const Fields = z
  .object({
    number: ProcedureCreate.shape.number,
    revision: ProcedureCreate.shape.revision,
    title: ProcedureCreate.shape.title,
    process: ProcedureCreate.shape.process,
    position: ProcedureCreate.shape.position,
    ...Object.fromEntries(
      rangeRows(NO_RANGES).flatMap(({ id }) => [
        [`${id}_min`, bound],
        [`${id}_max`, bound],
      ]),
    ),
  })
  .superRefine((fields: Readonly<Record<string, unknown>>, context) => {
    for (const { id, title } of rangeRows(NO_RANGES)) {
      const [min, max] = [fields[`${id}_min`] ?? null, fields[`${id}_max`] ?? null];
      if ((min === null) !== (max === null))
        context.addIssue({
          code: "custom",
          path: [min === null ? `${id}_min` : `${id}_max`],
          message: `${title} needs both ends, or none`,
        });
      else if (typeof min === "number" && typeof max === "number" && min > max)
        context.addIssue({ code: "custom", path: [`${id}_max`], message: "must not be below the other end" });
    }
  });

function rangesOf(fields: Readonly<Record<string, unknown>>): ProcedureRanges {
  const ranges = { ...NO_RANGES };
  for (const { id } of rangeRows(NO_RANGES)) {
    const [min, max] = [fields[`${id}_min`], fields[`${id}_max`]];
    if (typeof min === "number" && typeof max === "number") ranges[id] = { min, max };
  }
  return ranges;
}

/** A procedure is recorded as a draft. */
export default function ProcedureNewPage(): ReactElement {
  const navigate = useNavigate();
  const create = useCreateProcedure();
  const form = useForm({
    schema: Fields,
    start: { process: "135", position: "PB", revision: "1" },
    draft: "procedure-new",
    onSubmit: async (fields) => {
      const { number, revision, title, process, position } = fields;
      const procedure = await create.mutateAsync({
        number,
        revision,
        title,
        process,
        position,
        ranges: rangesOf(fields),
      });
      toast(`${procedure.number} rev ${procedure.revision} recorded as a draft`, "good");
      await navigate(pathTo("procedure", { id: procedure.id }));
    },
  });
  return (
    <>
      <PageHead
        title="Record a procedure"
        above={<Breadcrumbs trail={[{ to: PATHS.procedures.path, label: "Procedures" }]} />}
      />
      <div className="max-w-2xl">
        <Sheet>
          <Form
            form={form}
            action="Record as a draft"
            aside={<ButtonLink to={PATHS.procedures.path}>Cancel</ButtonLink>}
          >
            <TextField {...form.text("number")} label="Number" code />
            <TextField {...form.text("revision")} label="Revision" code />
            <TextField {...form.text("title")} label="Title" />
            <TextField {...form.text("process")} label="Process, ISO 4063" code />
            <TextField {...form.text("position")} label="Position, ISO 6947" code />
            {rangeRows(NO_RANGES).map(({ id, title, unit }) => (
              <fieldset key={id} className="grid grid-cols-2 gap-4">
                <legend className="sr-only">{title}</legend>
                <NumberField {...form.number(`${id}_min`)} label={`${title} from`} unit={unit} />
                <NumberField {...form.number(`${id}_max`)} label={`${title} to`} unit={unit} />
              </fieldset>
            ))}
          </Form>
        </Sheet>
      </div>
    </>
  );
}
