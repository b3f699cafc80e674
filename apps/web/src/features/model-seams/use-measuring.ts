import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SectionView } from "@beadroll/domain/schemas/section-view";
import { useCallback, useEffect, useRef, useState } from "react";
import type { MeasureQuestion, MeasureReply, MeasureTask } from "./measure-task.ts";

/** How measuring in this browser stands. */
export interface Measuring {
  readonly isBusy: boolean;
  readonly result: ScanResult | BeadResult | null;
  readonly taken_ms: number | null;
  readonly faults: readonly string[];
  readonly section: SectionView | null;
  measure(task: MeasureTask): void;
  cut(station_mm: number): void;
}

interface State {
  readonly isBusy: boolean;
  readonly result: ScanResult | BeadResult | null;
  readonly taken_ms: number | null;
  readonly faults: readonly string[];
  readonly section: SectionView | null;
}

const NOTHING: State = { isBusy: false, result: null, taken_ms: null, faults: [], section: null };

function after(state: State, reply: MeasureReply): State {
  switch (reply.kind) {
    case "measured":
      return { ...NOTHING, result: reply.result, taken_ms: reply.taken_ms };
    case "refused":
      return { ...NOTHING, faults: reply.faults };
    case "section":
      return { ...state, section: reply.section };
  }
}

/** Measures scan files in a worker of this browser; the page stays free, nothing is stored or sent. */
export function useMeasuring(): Measuring {
  const [state, setState] = useState(NOTHING);
  const worker = useRef<Worker | null>(null);
  // A worker lives outside React and ends with the page.
  useEffect(() => () => worker.current?.terminate(), []);
  const ask = useCallback((question: MeasureQuestion) => {
    if (worker.current === null) {
      const made = new Worker(new URL("./measure.worker.ts", import.meta.url), { type: "module" });
      made.onmessage = ({ data }: MessageEvent<MeasureReply>) => setState((before) => after(before, data));
      made.onerror = (event) => {
        setState({ ...NOTHING, faults: [`This browser could not measure it: ${event.message}`] });
        made.terminate();
        worker.current = null;
      };
      worker.current = made;
    }
    worker.current.postMessage(question);
  }, []);
  const measure = useCallback(
    (task: MeasureTask) => {
      setState({ ...NOTHING, isBusy: true });
      ask({ kind: "measure", task });
    },
    [ask],
  );
  const cut = useCallback((station_mm: number) => ask({ kind: "section", station_mm }), [ask]);
  return { ...state, measure, cut };
}
