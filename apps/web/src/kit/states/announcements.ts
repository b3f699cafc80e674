/** What is read out and, if it is a toast, shown for a while. */
export interface Announcement {
  readonly id: number;
  readonly text: string;
  readonly kind: "spoken" | "toast";
  readonly state: "good" | "attend" | "stop" | "plain";
}

const KEPT = 4;
let announcements: readonly Announcement[] = [];
let next = 1;
const listeners = new Set<() => void>();

function publish(list: readonly Announcement[]): void {
  announcements = list;
  for (const listener of listeners) listener();
}

/** Reads a sentence out to those who listen; nothing is shown. */
export function announce(text: string): void {
  publish([...announcements, { id: next++, text, kind: "spoken", state: "plain" } as const].slice(-KEPT));
}

/** Shows a short report at the foot of the screen and reads it out. It never bears what a page does not also show. */
export function toast(text: string, state: Announcement["state"] = "plain"): void {
  publish([...announcements, { id: next++, text, kind: "toast", state } as const].slice(-KEPT));
}

/** Takes a report away. */
export function dismiss(id: number): void {
  publish(announcements.filter((entry) => entry.id !== id));
}

/** The reports in force, oldest first. */
export function currentAnnouncements(): readonly Announcement[] {
  return announcements;
}

/** Calls back at each change. */
export function subscribeAnnouncements(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
