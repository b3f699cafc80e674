import { useEffect, useMemo, useRef, useState } from "react";

/** How long a change stays marked. */
const MARKED_MS = 6000;

/** What is marked, each until when (milliseconds of this screen's clock). */
export type Marks = ReadonlyMap<string, number>;

const NONE: Marks = new Map();

/** Keys whose value is another than before; new keys count, gone ones do not. */
export function changedKeys(
  before: ReadonlyMap<string, string>,
  now: ReadonlyMap<string, string>,
): ReadonlySet<string> {
  return new Set([...now].filter(([key, value]) => before.get(key) !== value).map(([key]) => key));
}

/** The marks after a change: what changed is marked anew, what was marked long enough is not. */
export function marksAfter(marks: Marks, changed: ReadonlySet<string>, now_ms: number): Marks {
  const still = [...marks].filter(([, until_ms]) => until_ms > now_ms);
  return new Map([...still, ...[...changed].map((key) => [key, now_ms + MARKED_MS] as const)]);
}

/** Keys that changed a few seconds ago, so that a live screen shows what moved. Nothing is marked at first sight. */
export function useChangedKeys(now: ReadonlyMap<string, string>): ReadonlySet<string> {
  const before = useRef(now);
  const [marks, setMarks] = useState<Marks>(NONE);
  // What was shown before is outside React's render.
  useEffect(() => {
    const changed = changedKeys(before.current, now);
    before.current = now;
    if (changed.size > 0) setMarks((old) => marksAfter(old, changed, Date.now()));
  }, [now]);
  // A mark goes by the clock, whatever else changes meanwhile.
  useEffect(() => {
    if (marks.size === 0) return undefined;
    const wait_ms = Math.min(...marks.values()) - Date.now();
    const timer = setTimeout(
      () => setMarks((old) => marksAfter(old, new Set(), Date.now())),
      Math.max(0, wait_ms),
    );
    return () => clearTimeout(timer);
  }, [marks]);
  return useMemo(() => new Set(marks.keys()), [marks]);
}
