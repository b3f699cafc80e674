import type { StateShape } from "./state-shape.tsx";

/** How strongly a state asks for somebody. */
export type StateTone = "good" | "attend" | "stop" | "none" | "plain";

export interface StateLook {
  readonly tone: StateTone;
  readonly shape: StateShape;
  readonly word: string;
}

const look = (tone: StateTone, shape: StateShape, word: string): StateLook => ({ tone, shape, word });

/** Shape, tone and word of every state and verdict, so that a state looks the same wherever it stands. */
export const STATE_LOOKS = {
  // Verdict of a scan
  within: look("good", "square", "Within"),
  adapt: look("attend", "triangle", "Adapt"),
  hold: look("stop", "diamond", "Hold"),
  // State of a seam or part
  planned: look("none", "open", "Planned"),
  held: look("stop", "diamond", "Held"),
  clear: look("good", "square", "Clear"),
  welded: look("plain", "ripples", "Welded"),
  accepted: look("good", "tick", "Accepted"),
  rejected: look("stop", "diamond", "Rejected"),
  repair: look("attend", "triangle", "Repair"),
  released: look("good", "seal", "Released"),
  on_hold: look("stop", "diamond", "On hold"),
  // Lots, calibrations, qualifications
  received: look("none", "open", "Received"),
  quarantined: look("stop", "diamond", "Quarantined"),
  used_up: look("none", "open", "Used up"),
  valid: look("good", "square", "Valid"),
  due: look("attend", "triangle", "Due soon"),
  expired: look("stop", "diamond", "Expired"),
  // What a page says of itself
  ready: look("good", "square", "Ready"),
  not_ready: look("stop", "diamond", "Not ready"),
  attend: look("attend", "triangle", "Attend"),
  stop: look("stop", "diamond", "Stop"),
  no_data: look("none", "dashed", "No data"),
} as const satisfies Record<string, StateLook>;

export type StateName = keyof typeof STATE_LOOKS;

/** Whether a text from outside names a state that has a look. */
export function isStateName(text: string): text is StateName {
  return Object.hasOwn(STATE_LOOKS, text);
}
