import type { PartPage } from "@beadroll/domain/schemas/part";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";

/** The parts built into this one. */
export function ContentsList(props: { contents: PartPage["contents"] }): ReactElement {
  return (
    <ul>
      {props.contents.map((part) => (
        <li key={part.tag} className="flex justify-between gap-3 py-0.5">
          <Link to={pathTo("part", { tag: part.tag })}>{part.name}</Link>
          <span className="figures text-ash">{part.tag}</span>
        </li>
      ))}
    </ul>
  );
}
