import { type ReactElement, useState } from "react";
import { Button, ButtonRow } from "../kit/actions/button.tsx";
import { NumberField } from "../kit/forms/number-field.tsx";
import { TextField } from "../kit/forms/text-field.tsx";
import { KeyValue } from "../kit/page/key-value.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { TagText } from "../kit/page/tag-text.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";
import { STATE_LOOKS, type StateName } from "../kit/states/state-words.ts";
import { BeadStrip } from "../kit/strip/bead-strip.tsx";
import type { StripStation } from "../kit/strip/strip-groups.ts";
import { TemperLegend } from "../kit/strip/temper-legend.tsx";
import type { Column } from "../kit/tables/columns.ts";
import { DataTable } from "../kit/tables/data-table.tsx";

interface DemoSeam {
  seam: string;
  joint: string;
  stations: StripStation[];
  largest_mm: number;
  heat_input_kj_mm: number;
  verdict: StateName;
}

const wave = (count: number, f: (t: number) => number | null): StripStation[] =>
  Array.from({ length: count }, (_, i) => {
    const share = f(i / (count - 1));
    const station_mm = i * 5;
    return share === null
      ? { station_mm, measured: false }
      : { station_mm, measured: true, deviation: share * 3, share: Math.abs(share) };
  });

const SEAMS: DemoSeam[] = [
  {
    seam: "S1",
    joint: "T, a5",
    stations: wave(65, (t) => 0.12 * Math.sin(t * 3)),
    largest_mm: 0.37,
    heat_input_kj_mm: 1.2,
    verdict: "within",
  },
  {
    seam: "S2",
    joint: "T, a5",
    stations: wave(65, (t) => -0.2 + 0.86 * t),
    largest_mm: 1.98,
    heat_input_kj_mm: 1,
    verdict: "adapt",
  },
  {
    seam: "S3",
    joint: "T, a5",
    stations: wave(65, (t) => (t > 0.46 && t < 0.51 ? null : 0.7 - Math.abs(t - 0.5) * 1.6)),
    largest_mm: 1.99,
    heat_input_kj_mm: 1,
    verdict: "adapt",
  },
  {
    seam: "S4",
    joint: "T, a5",
    stations: wave(65, (t) => 0.3 + 0.92 * t * t),
    largest_mm: 3.65,
    heat_input_kj_mm: 1.19,
    verdict: "hold",
  },
  {
    seam: "S5",
    joint: "T, a5",
    stations: wave(65, (t) => 0.16 * Math.cos(t * 4)),
    largest_mm: 0.5,
    heat_input_kj_mm: 0.97,
    verdict: "within",
  },
  {
    seam: "S6",
    joint: "T, a5",
    stations: wave(65, (t) => 0.37 * Math.cos(t * 5)),
    largest_mm: 1.11,
    heat_input_kj_mm: 1.09,
    verdict: "accepted",
  },
];

const COLUMNS: Column<DemoSeam>[] = [
  { id: "seam", head: "Seam", value: (r) => r.seam, figures: true, width: "4rem" },
  { id: "joint", head: "Joint", value: (r) => r.joint, width: "4rem" },
  {
    id: "strip",
    head: "Deviation along the seam, start to end",
    cell: (r) => (
      <BeadStrip stations={r.stations} label={`Seam ${r.seam}, lateral deviation`} tabStop={false} />
    ),
  },
  {
    id: "largest",
    head: "Largest",
    value: (r) => r.largest_mm,
    cell: (r) => `${r.largest_mm.toFixed(2)} mm`,
    align: "right",
    figures: true,
    width: "6rem",
    field: "largest_mm",
  },
  {
    id: "heat",
    head: "kJ/mm",
    value: (r) => r.heat_input_kj_mm,
    cell: (r) => r.heat_input_kj_mm.toFixed(2),
    align: "right",
    figures: true,
    width: "4.5rem",
    field: "heat_input_kj_mm",
  },
  {
    id: "verdict",
    head: "Verdict",
    value: (r) => r.verdict,
    cell: (r) => <StateMark state={r.verdict} />,
    width: "7rem",
  },
];

export default function KitPage(): ReactElement {
  const [name, setName] = useState("Web plate");
  const [gap, setGap] = useState<number | null>(3.2);
  return (
    <>
      <PageHead
        title="Skid frame 0418"
        facts={
          <>
            Drawing FW-2210 rev C · tag <TagText text="P-7K3F9Q2MX" /> · 6 seams, 1 on hold
          </>
        }
      />
      <SheetGrid>
        <Sheet title="The roll">
          <DataTable plain caption="Seams" rows={SEAMS} columns={COLUMNS} rowKey={(r) => r.seam} />
          <div className="mt-3">
            <TemperLegend />
          </div>
        </Sheet>
        <Sheet title="What went in">
          <KeyValue
            rows={[
              {
                key: "Web plate",
                value: (
                  <>
                    heat <TagText text="H48812" />
                  </>
                ),
              },
              {
                key: "Flange",
                value: (
                  <>
                    heat <TagText text="H50217" />
                  </>
                ),
              },
              {
                key: "Wire 1.2 mm",
                value: (
                  <>
                    lot <TagText text="W-3391" />
                  </>
                ),
              },
              { key: "Procedure", value: "PB-135-07 rev 2" },
            ]}
          />
        </Sheet>
      </SheetGrid>
      <SheetStack>
        <Sheet
          title={
            <>
              Seam S4 · <StateMark state="hold" word="Hold: lateral 3.41 mm at 311 mm, limit 3.00" />
            </>
          }
        >
          <BeadStrip size="sheet" stations={SEAMS[3]?.stations ?? []} label="Seam S4, lateral deviation" />
        </Sheet>
        <Sheet title="States">
          <div className="flex flex-wrap gap-x-8 gap-y-2">
            {(Object.keys(STATE_LOOKS) as StateName[]).map((state) => (
              <StateMark key={state} state={state} />
            ))}
          </div>
        </Sheet>
        <Sheet title="Form">
          <div className="grid gap-4">
            <TextField label="Piece" name="piece" value={name} onChange={setName} />
            <NumberField
              label="Gap"
              name="gap_mm"
              unit="mm"
              value={gap}
              onChange={setGap}
              limit="0 to 3 mm, from the model seam"
              error={(gap ?? 0) > 3 ? "At most 3 mm." : undefined}
            />
            <ButtonRow>
              <Button kind="primary">Save the piece</Button>
              <Button>Cancel</Button>
              <Button kind="danger">Hold 12 parts</Button>
              <Button kind="quiet">Show as table</Button>
            </ButtonRow>
          </div>
        </Sheet>
      </SheetStack>
    </>
  );
}
