import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import type { ReactElement, ReactNode } from "react";
import { UnitsProvider } from "../kit/units/units-context.tsx";
import { useUnitsChoice } from "./choices/units.ts";

/** One cache of what the server said, for the whole application; loaders fill it, pages read it. */
export const queryClient = new QueryClient({
  defaultOptions: { queries: { staleTime: 30_000, retry: 1, refetchOnWindowFocus: true } },
});

/** What every page can rely on: the cache, and the units of this screen. */
export function Providers(props: { children: ReactNode }): ReactElement {
  return (
    <QueryClientProvider client={queryClient}>
      <UnitsProvider units={useUnitsChoice()}>{props.children}</UnitsProvider>
    </QueryClientProvider>
  );
}
