import type { ReactElement } from "react";
import { Link } from "react-router";

/** The way here, from the list down; the page itself is the h1 and is not repeated. */
export function Breadcrumbs(props: { trail: readonly { to: string; label: string }[] }): ReactElement {
  return (
    <nav aria-label="The way here" className="screen-only mb-1 text-sm">
      <ol className="flex flex-wrap gap-x-2">
        {props.trail.map((step, index) => (
          <li key={step.label} className="flex gap-x-2">
            {index === 0 ? null : (
              <span aria-hidden="true" className="text-ash">
                /
              </span>
            )}
            <Link to={step.to}>{step.label}</Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}
