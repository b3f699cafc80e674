import type { ReactElement } from "react";
import { useRouteError } from "react-router";
import { Button } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";

/** What stands in a page's place when it could not be drawn. */
export function RouteFault(): ReactElement {
  const error = useRouteError();
  return (
    <>
      <PageHead title="This page could not be shown" />
      <FaultPanel problem={problemFrom(error)} onRetry={() => location.reload()} />
    </>
  );
}

/** An address that names no page. */
export function NotFound(): ReactElement {
  return (
    <>
      <PageHead title="Nothing here" />
      <Sheet>
        <p className="mb-4">
          This address names no page. Check it, or look for the thing itself with the search field above: a
          tag, serial, heat or name.
        </p>
        <Button onClick={() => history.back()}>Go back</Button>
      </Sheet>
    </>
  );
}
