import { getScanCloud } from "@beadroll/domain/contract/seams.contract";
import { type DrawnCloud, decodeCloud } from "@beadroll/domain/measure/cloud/cloud-codec";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useEffect, useRef, useState } from "react";
import { api } from "../../app/client.ts";
import { useThemeChoice } from "../../app/theme.ts";
import { Button } from "../../kit/actions/button.tsx";
import { useStationCursor } from "../../kit/cursor/cursor-context.tsx";
import { TemperLegend } from "../../kit/strip/temper-legend.tsx";
import { formatFigure } from "../../kit/units/length-units.ts";
import { CloudScene } from "./cloud-scene.ts";

/** How far one press turns the view, radians, and by how much it comes nearer. */
const TURN_RAD = Math.PI / 12;
const NEARER = 1.25;

async function fetchCloud(id: string, signal: AbortSignal): Promise<DrawnCloud> {
  const blob = await api.call(getScanCloud, { params: { id }, signal });
  return decodeCloud(new Uint8Array(await blob.arrayBuffer()));
}

/** The points of a scan over the nominal seam, to be turned by hand; the shared cursor is the section there. */
export function CloudViewer(props: { scanId: string; model: SeamModel }): ReactElement {
  const { model } = props;
  const { data: cloud } = useSuspenseQuery({
    queryKey: ["scans", "cloud", props.scanId],
    queryFn: ({ signal }) => fetchCloud(props.scanId, signal),
    staleTime: Number.POSITIVE_INFINITY,
  });
  const holder = useRef<HTMLDivElement>(null);
  const scene = useRef<CloudScene | null>(null);
  const [isMissing, setMissing] = useState(false);
  const [cursor_mm] = useStationCursor();
  const theme = useThemeChoice();
  // The drawing lives in the graphics card, outside React.
  useEffect(() => {
    if (holder.current === null) return undefined;
    const made = CloudScene.make(holder.current, model, cloud);
    setMissing(made === null);
    scene.current = made;
    return () => {
      made?.dispose();
      scene.current = null;
    };
  }, [model, cloud]);
  // biome-ignore lint/correctness/useExhaustiveDependencies: the colours are read from the page when the theme has changed
  useEffect(() => scene.current?.takeColours(), [theme]);
  useEffect(() => scene.current?.markStation(cursor_mm), [cursor_mm]);
  const shown = cloud.xyz_mm.length / 3;
  return (
    <div className="mt-3 grid gap-3">
      {isMissing ? (
        <p className="text-ash">
          This browser shows no 3D (WebGL is missing or switched off). The section at the cursor shows the
          same points.
        </p>
      ) : null}
      <div
        ref={holder}
        role="img"
        aria-label={`${shown} points of the scan over the nominal seam, coloured by their distance from the model's faces`}
        className={isMissing ? "hidden" : "h-[26rem] touch-none overflow-hidden rounded-sm border border-row"}
      />
      {isMissing ? null : (
        <>
          <div className="flex flex-wrap gap-2">
            <Button onClick={() => scene.current?.turn(-TURN_RAD, 0)}>Turn left</Button>
            <Button onClick={() => scene.current?.turn(TURN_RAD, 0)}>Turn right</Button>
            <Button onClick={() => scene.current?.turn(0, -TURN_RAD)}>Tilt up</Button>
            <Button onClick={() => scene.current?.turn(0, TURN_RAD)}>Tilt down</Button>
            <Button onClick={() => scene.current?.zoom(NEARER)}>Nearer</Button>
            <Button onClick={() => scene.current?.zoom(1 / NEARER)}>Farther</Button>
            <Button onClick={() => scene.current?.reset()}>Whole seam</Button>
          </div>
          <TemperLegend
            of={`the largest lateral deviation that may be followed (${formatFigure(scaleOf(model), 1)} mm)`}
          />
          <p className="text-sm text-ash">
            {shown === cloud.count ? `${shown} points` : `${shown} of ${cloud.count} points, evenly thinned`}.
            Drag to turn, wheel or pinch to come nearer, right button or two fingers to move. Colour is a
            point's distance from the model's faces; it is no measurement of the joint.
          </p>
        </>
      )}
    </div>
  );
}

const scaleOf = (model: SeamModel): number => CloudScene.limitOf(model);
