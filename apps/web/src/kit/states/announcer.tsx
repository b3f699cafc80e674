import { type ReactElement, useEffect, useSyncExternalStore } from "react";
import { type Announcement, currentAnnouncements, dismiss, subscribeAnnouncements } from "./announcements.ts";
import { StateMark, type StateTone } from "./state-mark.tsx";

const SHOWN_MS = 8000;

const MARKS: Record<Announcement["state"], { tone: StateTone; word: string } | null> = {
  good: { tone: "good", word: "Done" },
  attend: { tone: "attend", word: "Attend" },
  stop: { tone: "stop", word: "Not done" },
  plain: null,
};

/** The one live region of the page: speaks announcements, shows toasts. */
export function Announcer(): ReactElement {
  const all = useSyncExternalStore(subscribeAnnouncements, currentAnnouncements, currentAnnouncements);
  return (
    <>
      <div role="status" aria-live="polite" className="sr-only">
        {all.map((entry) => (
          <p key={entry.id}>{entry.text}</p>
        ))}
      </div>
      <div className="screen-only pointer-events-none fixed inset-x-4 bottom-4 z-40 flex flex-col items-start gap-2 sm:inset-x-6">
        {all
          .filter((entry) => entry.kind === "toast")
          .map((entry) => (
            <Toast key={entry.id} entry={entry} />
          ))}
      </div>
    </>
  );
}

function Toast(props: { entry: Announcement }): ReactElement {
  const { id, text, state } = props.entry;
  // A timer is outside React. What needs a decision stays until it is closed.
  useEffect(() => {
    if (state === "stop") return undefined;
    const timer = setTimeout(() => dismiss(id), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [id, state]);
  const mark = MARKS[state];
  return (
    <div className="pointer-events-auto flex max-w-xl items-start gap-3 rounded-sm border border-rule border-t-[3px] border-t-sheet-rule bg-sheet px-4 py-3 shadow-float">
      {mark === null ? null : <StateMark tone={mark.tone} word={mark.word} />}
      <span>{text}</span>
      <button
        type="button"
        onClick={() => dismiss(id)}
        className="ml-2 text-sm font-medium text-link hover:underline"
      >
        Close
      </button>
    </div>
  );
}
