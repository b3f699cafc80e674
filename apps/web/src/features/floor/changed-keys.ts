import { useEffect, useRef, useState } from "react";

/** How long a change stays marked. */
const MARKED_MS = 6000;

/** Keys whose value is another than before; new keys count, gone ones do not. */
export function changedKeys(
  before: ReadonlyMap<string, string>,
  now: ReadonlyMap<string, string>,
): ReadonlySet<string> {
  return new Set([...now].filter(([key, value]) => before.get(key) !== value).map(([key]) => key));
}

/** Keys that changed a few seconds ago, so that a live screen shows what moved. Nothing is marked at first sight. */
export function useChangedKeys(now: ReadonlyMap<string, string>): ReadonlySet<string> {
  const before = useRef(now);
  const [changed, setChanged] = useState<ReadonlySet<string>>(new Set());
  // What was shown before is outside React's render; the mark goes by a timer.
  useEffect(() => {
    const found = changedKeys(before.current, now);
    before.current = now;
    if (found.size === 0) return undefined;
    setChanged(found);
    const timer = setTimeout(() => setChanged(new Set()), MARKED_MS);
    return () => clearTimeout(timer);
  }, [now]);
  return changed;
}
