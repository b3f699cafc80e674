import type { ReactElement } from "react";
import { useNavigation } from "react-router";

/** A thin spark under the bar while the next page is fetched. */
export function NavigationProgress(): ReactElement {
  const isBusy = useNavigation().state !== "idle";
  return (
    <div
      aria-hidden="true"
      className={`absolute inset-x-0 bottom-0 h-[2px] origin-left bg-spark transition-transform duration-700 ${isBusy ? "scale-x-75" : "scale-x-0 duration-150"}`}
    />
  );
}
