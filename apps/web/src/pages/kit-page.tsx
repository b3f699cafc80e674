import type { ReactElement } from "react";
import { Button } from "../kit/actions/button.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { SheetStack } from "../kit/page/sheet.tsx";
import { TagText } from "../kit/page/tag-text.tsx";
import { FieldSpecimens, LotFormSpecimen } from "../kit/specimens/form-specimens.tsx";
import { RollSpecimen } from "../kit/specimens/roll-specimen.tsx";
import { StateSpecimens } from "../kit/specimens/state-specimens.tsx";
import { SeamSpecimen, StripStates } from "../kit/specimens/strip-specimens.tsx";
import { TableSpecimens } from "../kit/specimens/table-specimens.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";

/** Every part of the design kit in every state, with invented content. */
export default function KitPage(): ReactElement {
  return (
    <>
      <PageHead
        title="Skid frame 0418"
        above={
          <Breadcrumbs
            trail={[
              { to: "/kit", label: "Parts" },
              { to: "/kit", label: "FW-2210 rev C" },
            ]}
          />
        }
        facts={
          <>
            Drawing FW-2210 rev C · tag <TagText text="P-8K3F7Q2NA" copy /> · 6 seams, 1 on hold
          </>
        }
        state={<StateMark state="on_hold" />}
        actions={
          <>
            <Button>Print labels</Button>
            <Button kind="primary">Decide on S4</Button>
          </>
        }
      />
      <RollSpecimen />
      <SheetStack>
        <SeamSpecimen />
        <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 lg:grid-cols-2">
          <StripStates />
          <StateSpecimens />
          <LotFormSpecimen />
          <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
            <FieldSpecimens />
          </div>
        </div>
        <TableSpecimens />
      </SheetStack>
    </>
  );
}
