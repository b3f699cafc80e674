import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { lazy, type ReactElement, Suspense, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { PagePart } from "../../kit/states/fault-boundary.tsx";
import { Loading } from "../../kit/states/loading.tsx";

// The viewer brings a 3D library with it; nobody loads that who does not ask for it.
const CloudViewer = lazy(async () => ({ default: (await import("./cloud-viewer.tsx")).CloudViewer }));

/** A scan's points over its model in space, loaded when asked for. */
export function CloudView(props: { scanId: string; model: SeamModel }): ReactElement {
  const [isShown, setShown] = useState(false);
  return (
    <div className="screen-only mt-4 border-t border-row pt-3">
      <Button kind="quiet" aria-expanded={isShown} onClick={() => setShown(!isShown)}>
        {isShown ? "Hide the scan in 3D" : "Show the scan in 3D"}
      </Button>
      {isShown ? (
        <PagePart label="The scan in 3D" rows={10}>
          <Suspense fallback={<Loading label="The scan in 3D" rows={10} />}>
            <CloudViewer scanId={props.scanId} model={props.model} />
          </Suspense>
        </PagePart>
      ) : null}
    </div>
  );
}
