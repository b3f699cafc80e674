import { type FormEvent, Fragment, type ReactElement, useState } from "react";
import { useNavigate } from "react-router";
import { findPath, pathTo } from "../../app/paths.ts";
import { Button, ButtonLink } from "../../kit/actions/button.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { PageHead } from "../../kit/page/page-head.tsx";
import { Sheet } from "../../kit/page/sheet.tsx";
import { readTag, type TagFault, type TagPlaces } from "./tag-reading.ts";

/** A text that led to no page, and why. */
export interface RefusedTag {
  readonly typed: string;
  readonly fault: TagFault;
}

/** A tag that leads nowhere: why, where the doubt is, and a field to mend it in place. */
export function TagCorrection(props: RefusedTag): ReactElement {
  const navigate = useNavigate();
  const [text, setText] = useState(props.typed);
  const [{ typed, fault }, setRefused] = useState<RefusedTag>(props);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const read = readTag(text);
    if (read.ok) void navigate(pathTo("tagDoor", { tag: read.tag }));
    else setRefused({ typed: text.trim(), fault: read.fault });
  };
  return (
    <div className="mx-auto max-w-xl">
      <PageHead title={fault.heading} facts={<span className="figures break-all">{typed}</span>} />
      <Sheet>
        <div role="alert">
          {fault.doubt === null ? null : <DoubtfulTag places={fault.doubt} />}
          <p className="font-medium">{unbroken(fault.why)}</p>
          <p className="mt-1 text-ash">{fault.todo}</p>
        </div>
        {fault.doubt === null ? null : <Suggestion places={fault.doubt} />}
        <form className="mt-5 grid gap-4 border-t border-row pt-5" onSubmit={submit}>
          <TextField
            label="Tag"
            name="tag"
            value={text}
            onChange={setText}
            limit="Hyphens, case, O for 0 and I or L for 1 do not matter."
            code
            large
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" kind="primary" large>
              Open the tag
            </Button>
            {readTag(typed).ok ? null : (
              <ButtonLink to={findPath(text.trim())} large>
                Search for it
              </ButtonLink>
            )}
          </div>
        </form>
      </Sheet>
    </div>
  );
}

/** Tags in a sentence are not broken at their hyphen. */
const unbroken = (sentence: string) => sentence.replace(/\b([A-Z])-(?=[0-9A-Z]{9}\b)/g, "$1\u2011");

/** The tag in large letters; the doubtful ones stand in a frame with a mark under them. */
function DoubtfulTag(props: { places: TagPlaces }): ReactElement {
  const { symbols, places } = props.places;
  return (
    <p aria-hidden="true" className="mb-4 flex font-mono text-[clamp(1.25rem,6vw,1.875rem)] leading-none">
      {[...symbols].map((symbol, place) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a symbol is its place
        <Fragment key={place}>
          <TagSymbol text={symbol} isDoubtful={places.includes(place)} />
          {place === 0 ? <span className="px-0.5 pt-1.5">-</span> : null}
        </Fragment>
      ))}
    </p>
  );
}

function TagSymbol(props: { text: string; isDoubtful: boolean }): ReactElement {
  const frame = props.isDoubtful ? "rounded-sm border-stop text-stop" : "border-transparent";
  return (
    <span className={`flex w-[1.1em] flex-col items-center gap-1 border-2 pt-1 pb-1.5 ${frame}`}>
      {props.text}
      <span className="text-[0.6em] leading-none">{props.isDoubtful ? "◆" : "\u00a0"}</span>
    </span>
  );
}

function Suggestion(props: { places: TagPlaces }): ReactElement {
  const { suggestion } = props.places;
  return (
    <p className="mt-4">
      <ButtonLink to={pathTo("tagDoor", { tag: suggestion })}>
        Open <span className="font-mono">{suggestion}</span> if the label says so
      </ButtonLink>
    </p>
  );
}
