import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type ReactElement, type ReactNode, useMemo } from "react";
import { Sheet } from "../../kit/page/sheet.tsx";
import { PlotStack } from "../../kit/plots/plot-stack.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { BeadFindings } from "./bead-findings.tsx";
import { beadPlots } from "./bead-plots.ts";

/** What a finished weld's verdict means, or its first reason. */
export function beadSentence({ verdict, reasons, requirement }: BeadResult): string {
  const level = `level ${requirement.quality_level}`;
  if (verdict === "within") return `Within: the weld's face keeps ${level}.`;
  return `Hold: ${reasons[0] ?? `not proved to keep ${level}`}`;
}

/** A finished weld: verdict, findings against its level, and its figures along the seam. */
export function FinishedBead(props: {
  label: string;
  result: BeadResult;
  model: SeamModel;
  aside?: string;
  /** Stands under the drawings. */
  children?: ReactNode;
}): ReactElement {
  const { result, model } = props;
  const plots = useMemo(() => beadPlots(result), [result]);
  const { quality_level, edition, weld_size_mm } = result.requirement;
  const unmeasured = result.reasons.filter((reason) => !result.findings.some(({ text }) => text === reason));
  return (
    <Sheet
      title={<StateMark state={result.verdict} word={beadSentence(result)} />}
      {...(props.aside !== undefined && { aside: props.aside })}
    >
      <p className="mb-3 text-ash">
        Finished bead, held against ISO 5817:{edition} level {quality_level}, size {weld_size_mm} mm.{" "}
        {[...unmeasured, ...result.warnings].join(" ")}
      </p>
      <div className="mb-5">
        <BeadFindings result={result} />
      </div>
      <PlotStack
        label={`${props.label}, finished bead`}
        plots={plots}
        length_mm={model.seam.length_mm}
        height={84}
      />
      {props.children}
    </Sheet>
  );
}
