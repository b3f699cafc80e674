import type { ReactElement } from "react";
import { CursorProvider } from "../cursor/cursor-context.tsx";
import { Sheet } from "../page/sheet.tsx";
import { PlotStack } from "../plots/plot-stack.tsx";
import { SectionView } from "../section/section-view.tsx";
import { StateMark } from "../states/state-mark.tsx";
import { BeadStrip } from "../strip/bead-strip.tsx";
import { stationsFromShares } from "../strip/strip-from-shares.ts";
import {
  LONG_STRIP,
  SPECIMEN_LENGTH_MM,
  SPECIMEN_PLOTS,
  SPECIMEN_SEAMS,
  SPECIMEN_SECTION,
} from "./specimen-data.ts";

const SHARES = stationsFromShares([0.1, 0.3, -0.2, null, null, 0.6, 0.8, 1.2, 0.9, 0.4, -0.4, -0.6], 120);
const S4 = SPECIMEN_SEAMS[3]?.stations ?? [];

/** A seam large, with its plots and section on one cursor. */
export function SeamSpecimen(): ReactElement {
  return (
    <CursorProvider>
      <Sheet
        title={
          <span className="flex flex-wrap gap-x-2">
            Seam S4 · <StateMark state="hold" word="Hold: lateral 3.41 mm at 311 mm, limit 3.00" />
          </span>
        }
      >
        <PlotStack
          label="Seam S4"
          plots={SPECIMEN_PLOTS}
          length_mm={SPECIMEN_LENGTH_MM}
          marks={[
            { station_mm: 124, label: "2017 surface pore, 0.8 mm", tone: "attend" },
            { station_mm: 186, label: "arc restart", tone: "plain" },
            { station_mm: 311, label: "largest lateral", tone: "stop" },
          ]}
          above={(layout) => (
            <BeadStrip
              size="sheet"
              stations={S4}
              length_mm={SPECIMEN_LENGTH_MM}
              label="Seam S4, lateral deviation"
              inset={layout}
            />
          )}
        />
      </Sheet>
    </CursorProvider>
  );
}

/** The strip in its other states, and a section. */
export function StripStates(): ReactElement {
  return (
    <>
      <Sheet title="Section at the cursor">
        <SectionView section={SPECIMEN_SECTION} />
      </Sheet>
      <Sheet title="The strip in other states">
        <div className="grid gap-3">
          <Named name="2400 stations, thinned to the worst of each group, on a canvas">
            <BeadStrip stations={LONG_STRIP} label="Long seam, lateral deviation" surface="canvas" />
          </Named>
          <Named name="As lists have it: shares of the limit only">
            <BeadStrip stations={SHARES} length_mm={120} label="Seam S7" />
          </Named>
          <Named name="Nothing measured">
            <BeadStrip
              stations={SHARES.map((station) => ({ station_mm: station.station_mm, measured: false }))}
              length_mm={120}
              label="Seam S8"
            />
          </Named>
          <Named name="No stations">
            <BeadStrip stations={[]} label="Seam S9" />
          </Named>
        </div>
      </Sheet>
    </>
  );
}

function Named(props: { name: string; children: ReactElement }): ReactElement {
  return (
    <div>
      <div className="text-sm text-ash">{props.name}</div>
      {props.children}
    </div>
  );
}
