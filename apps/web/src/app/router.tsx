import type { ReactElement } from "react";
import { createBrowserRouter, Outlet, type RouteObject } from "react-router";
import { Loading } from "../kit/states/loading.tsx";
import { pageModule, pageNames } from "./page-modules.ts";
import { PATHS, type PageName } from "./paths.ts";
import { NotFound, RouteFault } from "./route-fault.tsx";
import { Shell } from "./shell.tsx";

/** Every page that exists, each with its own code, inside the shell. */
export function appRouter(): ReturnType<typeof createBrowserRouter> {
  return createBrowserRouter([
    {
      path: "/",
      element: <ShellRoute />,
      hydrateFallbackElement: <Loading label="Beadroll" />,
      children: [
        {
          errorElement: <RouteFault />,
          children: [...pageNames().flatMap(pageRoute), { path: "*", element: <NotFound /> }],
        },
      ],
    },
  ]);
}

/** The seam where the session hands the shell who is signed in. */
function ShellRoute(): ReactElement {
  return (
    <Shell person={null}>
      <Outlet />
    </Shell>
  );
}

function pageRoute(name: PageName): RouteObject[] {
  const load = pageModule(name);
  if (load === undefined) return [];
  return [
    {
      path: PATHS[name].path,
      lazy: async () => {
        const page = await load();
        return page.loader === undefined
          ? { Component: page.default }
          : { Component: page.default, loader: page.loader };
      },
    },
  ];
}
