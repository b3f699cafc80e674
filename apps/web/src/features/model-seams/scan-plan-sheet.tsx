import { planScan } from "@beadroll/domain/measure/plan/plan-scan";
import { type ScanPlan, ScanPlanInput } from "@beadroll/domain/schemas/scan-plan";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type ReactElement, useState } from "react";
import { NumberField } from "../../kit/fields/number-field.tsx";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { Sheet } from "../../kit/page/sheet.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { formatFigure } from "../../kit/units/length-units.ts";

/** A usual scanner of 100 mm, to begin with; each figure is the reader's to change. */
const START = {
  profile_rate_hz: 200,
  points_per_profile: 1280,
  near_mm: 120,
  far_mm: 220,
  width_near_mm: 60,
  width_far_mm: 100,
  stand_off_mm: 170,
  travel_mm_s: 100,
};
type Figures = { readonly [Name in keyof typeof START]: number | null };

const FIELDS: readonly {
  readonly name: keyof typeof START;
  readonly label: string;
  readonly unit?: string;
}[] = [
  { name: "travel_mm_s", label: "Travel while scanning", unit: "mm/s" },
  { name: "stand_off_mm", label: "Stand-off", unit: "mm" },
  { name: "profile_rate_hz", label: "Profiles a second", unit: "Hz" },
  { name: "points_per_profile", label: "Points a profile" },
  { name: "near_mm", label: "Range begins at", unit: "mm" },
  { name: "far_mm", label: "Range ends at", unit: "mm" },
  { name: "width_near_mm", label: "Field's width there, near", unit: "mm" },
  { name: "width_far_mm", label: "Field's width there, far", unit: "mm" },
];

/** The plan of the figures, or what is wrong with them. */
function planned(model: SeamModel, figures: Figures): { plan: ScanPlan } | { wrong: string } {
  const { stand_off_mm, travel_mm_s, ...scanner } = figures;
  const parsed = ScanPlanInput.safeParse({ scanner, stand_off_mm, travel_mm_s });
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    return { wrong: `${String(issue?.path.at(-1) ?? "A figure")}: ${issue?.message ?? "is missing"}` };
  }
  try {
    return { plan: planScan(model, parsed.data) };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { wrong: error.message };
  }
}

/** What a scan of this seam will give with a scanner and a speed. Worked out here, nothing is sent. */
export function ScanPlanSheet(props: { model: SeamModel }): ReactElement {
  const [figures, setFigures] = useState<Figures>(START);
  const found = planned(props.model, figures);
  return (
    <Sheet title="Scan plan">
      <div className="grid gap-x-8 gap-y-4 sm:grid-cols-2 lg:grid-cols-4">
        {FIELDS.map(({ name, label, unit }) => (
          <NumberField
            key={name}
            name={name}
            label={label}
            {...(unit !== undefined && { unit })}
            value={figures[name]}
            onChange={(value) => setFigures({ ...figures, [name]: value })}
          />
        ))}
      </div>
      <div className="mt-5 border-t border-row pt-4" aria-live="polite">
        {"wrong" in found ? <p className="text-stop">{found.wrong}</p> : <PlanFound plan={found.plan} />}
      </div>
    </Sheet>
  );
}

function PlanFound(props: { plan: ScanPlan }): ReactElement {
  const { plan } = props;
  return (
    <div className="grid gap-x-10 gap-y-4 lg:grid-cols-[18rem_minmax(0,1fr)]">
      <div>
        <StateMark
          tone={plan.serves ? "good" : "attend"}
          word={plan.serves ? "The plan serves" : "The plan does not serve"}
        />
        <div className="mt-2">
          <KeyValue
            rows={[
              { key: "Profiles", value: <span className="figures">{plan.profiles}</span> },
              { key: "Apart", value: <LengthText length_mm={plan.profile_spacing_mm} decimals={2} /> },
              { key: "Points apart", value: <LengthText length_mm={plan.point_spacing_mm} decimals={3} /> },
              { key: "Passes", value: <span className="figures">{plan.passes}</span> },
              { key: "Time", value: <span className="figures">{formatFigure(plan.time_s, 1)} s</span> },
            ]}
          />
        </div>
      </div>
      <ul className="grid content-start gap-1.5">
        {plan.checks.map((check) => (
          <li key={check.check} className="flex items-baseline gap-3">
            <StateMark tone={check.ok ? "good" : "attend"} word={check.ok ? "serves" : "look"} />
            <span>{check.text}</span>
          </li>
        ))}
      </ul>
    </div>
  );
}
