import type { ReactElement } from "react";
import {
  createBrowserRouter,
  type LoaderFunctionArgs,
  Navigate,
  Outlet,
  type RouteObject,
  useLocation,
  useNavigate,
} from "react-router";
import { toast } from "../kit/states/announcements.ts";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import { pageModule, pageNames } from "./page-modules.ts";
import { PATHS, type PageName } from "./paths.ts";
import { NotFound, RouteFault } from "./route-fault.tsx";
import { requireSession, signInPath, signOut, useAccount } from "./session.ts";
import { sessionState } from "./session-store.ts";
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

/** Pages that open without an account. */
const OPEN_PAGES: ReadonlySet<PageName> = new Set(["signIn", "kit"]);
const OPEN_PATHS: ReadonlySet<string> = new Set([...OPEN_PAGES].map((name) => PATHS[name].path));

/** The shell with who is signed in. A session that ends while a page is open leads to the sign-in page and back. */
function ShellRoute(): ReactElement {
  const account = useAccount();
  const { pathname, search } = useLocation();
  const navigate = useNavigate();
  if (account === null && sessionState().status === "out" && !OPEN_PATHS.has(pathname))
    return <Navigate to={signInPath(`${pathname}${search}`)} replace />;
  const onSignOut = () => {
    signOut().then(
      () => navigate(PATHS.signIn.path),
      (error: unknown) => toast(problemFrom(error).title),
    );
  };
  const person = account && { name: account.name, role: account.roles.join(", "), onSignOut };
  return (
    <Shell person={person} isDoor={pathname === PATHS.signIn.path}>
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
        if (OPEN_PAGES.has(name)) return { Component: page.default };
        const { loader } = page;
        return {
          Component: page.default,
          loader: async (given: LoaderFunctionArgs) => {
            await requireSession(given.request);
            return loader === undefined ? null : loader(given);
          },
        };
      },
    },
  ];
}
