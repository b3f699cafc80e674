import { temperColour } from "@beadroll/domain/quality/temper";
import type { ReactElement } from "react";

const STEPS = 40;
/** The legend's last part stands for all that is beyond the limit. */
const LIMIT_AT = 0.87;

/** What the temper colours mean. Stands under every list or drawing that uses them. */
export function TemperLegend(props: { of?: string }): ReactElement {
  return (
    <figure
      aria-label={`Colour: share of ${props.of ?? "the limit"} used, from plate grey to blue at the limit, ember red beyond it`}
    >
      <svg aria-hidden="true" viewBox="0 0 100 10" preserveAspectRatio="none" className="block h-2.5 w-full">
        {Array.from({ length: STEPS }, (_, step) => (
          <rect
            key={temperColour((step + 0.5) / STEPS)}
            x={(step * 100 * LIMIT_AT) / STEPS}
            width={(100 * LIMIT_AT) / STEPS + 0.1}
            height="10"
            fill={temperColour((step + 0.5) / STEPS)}
          />
        ))}
        <rect x={100 * LIMIT_AT} width={100 * (1 - LIMIT_AT)} height="10" fill={temperColour(1.01)} />
      </svg>
      <div
        aria-hidden="true"
        className="relative mt-1 flex justify-between text-xs whitespace-nowrap text-ash"
      >
        <span>on the model</span>
        <span className="absolute -translate-x-1/2" style={{ left: `${50 * LIMIT_AT}%` }}>
          half the limit
        </span>
        <span className="absolute -translate-x-full pr-1" style={{ left: `${100 * LIMIT_AT}%` }}>
          at the limit
        </span>
        <span>beyond</span>
      </div>
    </figure>
  );
}
