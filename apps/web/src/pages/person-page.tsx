import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { peopleQueries } from "../features/people/people.queries.ts";
import { QualificationForm } from "../features/people/qualification-form.tsx";
import { Qualifications } from "../features/people/qualifications.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid } from "../kit/page/sheet.tsx";
import { TagText } from "../kit/page/tag-text.tsx";

/** Fetches the person. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  await queryClient.ensureQueryData(peopleQueries.one(params["tag"] ?? ""));
  return null;
}

/** A person with their qualifications. */
export default function PersonPage(): ReactElement {
  const { data: person } = useSuspenseQuery(peopleQueries.one(useParams()["tag"] ?? ""));
  const mayWrite = useMay("people:write");
  return (
    <>
      <PageHead
        title={person.name}
        above={<Breadcrumbs trail={[{ to: PATHS.people.path, label: "People" }]} />}
        facts={
          <>
            {person.job} · badge <TagText text={person.tag} copy />
            {person.active ? "" : " · no longer here"}
          </>
        }
      />
      <SheetGrid>
        <Sheet title="Qualifications">
          <Qualifications qualifications={person.qualifications} />
        </Sheet>
        {mayWrite ? (
          <Sheet title="Add a qualification">
            <QualificationForm tag={person.tag} />
          </Sheet>
        ) : null}
      </SheetGrid>
    </>
  );
}
