import { printLabels } from "@beadroll/domain/contract/parts.contract";
import { LABEL_LAYOUTS, type LabelLayout, labelSheet } from "@beadroll/domain/labels/label-sheets";
import { type FormEvent, type ReactElement, useState } from "react";
import { api } from "../../app/client.ts";
import { Button } from "../../kit/actions/button.tsx";
import { ChoiceField } from "../../kit/fields/choice-field.tsx";
import { NumberField } from "../../kit/fields/number-field.tsx";
import { SelectField } from "../../kit/fields/select-field.tsx";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { type ProblemWords, problemFrom } from "../../kit/states/problem-words.ts";
import { saveFile } from "../../kit/tables/save-file.ts";

const LAYOUT_WORDS: Readonly<Record<LabelLayout, string>> = {
  "sheet-a4-3x8": "A4 sheet, 24 labels of 70 × 37 mm",
  "sheet-letter-3x10": "Letter sheet, 30 labels of 66.7 × 25.4 mm",
  single: "Label printer, one label a page",
};

const WHAT = ["all", "part", "seams", "strip"] as const;
const WHAT_WORDS: Readonly<Record<(typeof WHAT)[number], string>> = {
  all: "The part and each seam",
  part: "The part only",
  seams: "Each seam only",
  strip: "One part label with a strip of seam codes",
};

interface Choices {
  readonly layout: LabelLayout;
  readonly what: (typeof WHAT)[number];
  readonly width_mm: number | null;
  readonly height_mm: number | null;
  readonly start: number | null;
}

/** Prints labels of a part and its seams as PDF: layout, size, first free place, what. */
export function LabelsForm(props: { tag: string; serial: string; onDone: () => void }): ReactElement {
  const [choices, setChoices] = useState<Choices>({
    layout: "sheet-a4-3x8",
    what: "all",
    width_mm: 62,
    height_mm: 29,
    start: 1,
  });
  const [isBusy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemWords | null>(null);
  const { layout, what, width_mm, height_mm, start } = choices;
  const isSingle = layout === "single";
  const sheet = labelSheet({ layout, width_mm: width_mm ?? 62, height_mm: height_mm ?? 29, start: 1 });
  const places = sheet.columns * sheet.rows;
  const set = (change: Partial<Choices>) => setChoices({ ...choices, ...change });
  const print = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    setProblem(null);
    try {
      const size = isSingle
        ? { ...(width_mm !== null && { width_mm }), ...(height_mm !== null && { height_mm }) }
        : { ...(start !== null && { start }) };
      const pdf = await api.call(printLabels, {
        params: { tag: props.tag },
        query: { layout, what, ...size },
      });
      saveFile(pdf, `labels-${props.serial}.pdf`);
      props.onDone();
    } catch (error) {
      setProblem(problemFrom(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <form className="grid gap-5" onSubmit={(event) => void print(event)}>
      <SelectField
        label="Layout"
        name="layout"
        value={layout}
        onChange={(value) => set({ layout: value })}
        options={LABEL_LAYOUTS.map((value) => ({ value, label: LAYOUT_WORDS[value] }))}
      />
      {isSingle ? (
        <div className="grid gap-5 sm:grid-cols-2">
          <NumberField
            label="Width"
            name="width_mm"
            unit="mm"
            value={width_mm}
            onChange={(value) => set({ width_mm: value })}
          />
          <NumberField
            label="Height"
            name="height_mm"
            unit="mm"
            value={height_mm}
            onChange={(value) => set({ height_mm: value })}
          />
        </div>
      ) : (
        <NumberField
          label="First free place on the sheet"
          name="start"
          value={start}
          onChange={(value) => set({ start: value })}
          limit={`1 to ${places}, counted row by row`}
        />
      )}
      <ChoiceField
        label="What"
        name="what"
        value={what}
        onChange={(value) => set({ what: value })}
        options={WHAT.map((value) => ({ value, label: WHAT_WORDS[value] }))}
      />
      {problem === null ? null : <FaultPanel problem={problem} />}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" busy={isBusy}>
          Make the PDF
        </Button>
        <Button onClick={props.onDone}>Close</Button>
      </div>
    </form>
  );
}
