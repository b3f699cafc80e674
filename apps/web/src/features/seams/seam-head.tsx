import type { SeamPage } from "@beadroll/domain/schemas/seam";
import type { ReactElement, ReactNode } from "react";
import { PageHead } from "../../kit/page/page-head.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { jointWords, nextStep, seamNumber } from "./seam-words.ts";

/** What seam it is, in what state and why, and what is to be done now. */
export function SeamHead(props: { seam: SeamPage; above: ReactNode }): ReactElement {
  const { seam } = props;
  return (
    <>
      <PageHead
        title={`Seam ${seamNumber(seam.number, seam.attempt)}`}
        above={props.above}
        state={<StateMark state={seam.state} />}
        facts={
          <>
            {jointWords(seam.joint_type, seam.weld_size_mm)},{" "}
            <LengthText length_mm={seam.length_mm} decimals={0} /> · {seam.part_name} · drawing{" "}
            {seam.drawing_number} rev {seam.drawing_revision} · tag <TagText text={seam.tag} copy />
          </>
        }
      />
      <p className="-mt-3 mb-5">
        {seam.state_reason} <strong className="font-semibold">{nextStep(seam.state)}</strong>
      </p>
    </>
  );
}
