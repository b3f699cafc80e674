import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useMemo, useState } from "react";
import { Link, type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { useChangedKeys } from "../features/floor/changed-keys.ts";
import { LabelsDialog } from "../features/labels/labels-dialog.tsx";
import { ContentsList } from "../features/parts/contents-list.tsx";
import { PartTodo } from "../features/parts/part-todo.tsx";
import { partLook, tallyWords } from "../features/parts/part-words.ts";
import { partQueries } from "../features/parts/parts.queries.ts";
import { PieceForm } from "../features/parts/piece-form.tsx";
import { RollTable } from "../features/parts/roll-table.tsx";
import { WentIn } from "../features/parts/went-in.tsx";
import { WorstSeam } from "../features/parts/worst-seam.tsx";
import { SeamLedger } from "../features/seams/seam-ledger.tsx";
import { Button } from "../kit/actions/button.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { TagText } from "../kit/page/tag-text.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";
import { TemperLegend } from "../kit/strip/temper-legend.tsx";

/** Fetches the part with its roll. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  await queryClient.ensureQueryData(partQueries.one(params["tag"] ?? ""));
  return null;
}

/** A part: its roll of seams, what must be done, what went in. */
export default function PartPage(): ReactElement {
  const { data: part } = useSuspenseQuery(partQueries.one(useParams()["tag"] ?? ""));
  const [isPrinting, setPrinting] = useState(false);
  const mayPrint = useMay("labels:print");
  const mayBuild = useMay("parts:write");
  const seen = useMemo(() => new Map(part.roll.map((seam) => [seam.id, seam.changed_at])), [part]);
  const changed = useChangedKeys(seen);
  return (
    <>
      <PageHead
        title={part.name}
        above={<Breadcrumbs trail={[{ to: PATHS.parts.path, label: "Parts" }]} />}
        state={<StateMark {...partLook(part.seams)} />}
        facts={
          <>
            Drawing{" "}
            <Link to={pathTo("drawing", { id: part.drawing_id })}>
              {part.drawing_number} rev {part.drawing_revision}
            </Link>
            {part.order_no === null ? null : <> · order {part.order_no}</>} · tag{" "}
            <TagText text={part.tag} copy /> · {tallyWords(part.seams)}
            {part.parent_tag === null ? null : (
              <>
                {" "}
                · in <TagText text={part.parent_tag} to={pathTo("part", { tag: part.parent_tag })} />
              </>
            )}
          </>
        }
        actions={mayPrint ? <Button onClick={() => setPrinting(true)}>Print labels</Button> : null}
      />
      <PartTodo roll={part.roll} />
      <SheetGrid>
        <SheetStack>
          <Sheet title="The roll" flush>
            {part.roll.length === 0 ? (
              <div className="px-[1.125rem] pb-3">
                <EmptyState title="This drawing has no model seams">
                  A part's seams are planned from its drawing when the part is started. Add model seams to the
                  drawing, then start the next part.
                </EmptyState>
              </div>
            ) : (
              <>
                <RollTable roll={part.roll} fileName={`roll-${part.serial}`} changed={changed} />
                <div className="px-[1.125rem] pt-3 pb-3">
                  <TemperLegend />
                </div>
              </>
            )}
          </Sheet>
          <WorstSeam roll={part.roll} />
        </SheetStack>
        <SheetStack>
          <Sheet title="What went in">
            <WentIn rows={part.went_in} />
          </Sheet>
          {part.contents.length === 0 ? null : (
            <Sheet title="Parts in it">
              <ContentsList contents={part.contents} />
            </Sheet>
          )}
          {mayBuild ? (
            <Sheet title="Build a piece in">
              <PieceForm tag={part.tag} />
            </Sheet>
          ) : null}
          <Sheet title="Ledger">
            <SeamLedger tag={part.tag} seqs={part.ledger_seqs} />
          </Sheet>
        </SheetStack>
      </SheetGrid>
      <LabelsDialog
        tag={part.tag}
        serial={part.serial}
        open={isPrinting}
        onClose={() => setPrinting(false)}
      />
    </>
  );
}
