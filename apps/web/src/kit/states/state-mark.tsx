import type { ReactElement } from "react";
import { type StateShape, StateShapeIcon } from "./state-shape.tsx";
import { STATE_LOOKS, type StateName, type StateTone } from "./state-words.ts";

export type { StateTone } from "./state-words.ts";

const TONE_CLASS: Record<StateTone, string> = {
  good: "text-good",
  attend: "text-attend",
  stop: "text-stop",
  none: "text-ash",
  plain: "text-ink",
};

const TONE_SHAPE: Record<StateTone, StateShape> = {
  good: "square",
  attend: "triangle",
  stop: "diamond",
  none: "dashed",
  plain: "open",
};

type StateMarkProps =
  | { state: StateName; word?: string; large?: boolean }
  | { tone: StateTone; word: string; shape?: StateShape; large?: boolean };

/** A state as shape and word. Give a known `state`, or a `tone` with a word of your own. */
export function StateMark(props: StateMarkProps): ReactElement {
  const { tone, shape, word } =
    "state" in props
      ? { ...STATE_LOOKS[props.state], word: props.word ?? STATE_LOOKS[props.state].word }
      : { tone: props.tone, shape: props.shape ?? TONE_SHAPE[props.tone], word: props.word };
  const large = props.large === true;
  return (
    <span
      className={`inline-flex items-center whitespace-nowrap ${TONE_CLASS[tone]} ${large ? "gap-2.5 text-xl" : "gap-2"} ${tone === "none" ? "" : "font-semibold"}`}
    >
      <StateShapeIcon shape={shape} size={large ? 18 : 12} />
      {word}
    </span>
  );
}
