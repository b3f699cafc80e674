import { getFloor } from "@beadroll/domain/contract/cells.contract";
import { queryOptions } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** The floor changes with every scan and pass: asked again while it is looked at. */
export const LIVE_MS = 5000;

/** Every cell now, and the seams that wait. */
export const floorQuery = () =>
  queryOptions({
    queryKey: ["floor"],
    queryFn: ({ signal }) => api.call(getFloor, { signal }),
    refetchInterval: LIVE_MS,
  });
