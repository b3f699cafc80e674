import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { CertificateForm } from "../features/lots/certificate-form.tsx";
import { Certificates } from "../features/lots/certificates.tsx";
import { LotStateButtons } from "../features/lots/lot-state.tsx";
import { LotUses } from "../features/lots/lot-uses.tsx";
import { KIND_WORDS, numberWord } from "../features/lots/lot-words.ts";
import { lotQueries } from "../features/lots/lots.queries.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { KeyValue } from "../kit/page/key-value.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { TagText } from "../kit/page/tag-text.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";
import { DayText } from "../kit/units/instant-text.tsx";
import { LengthText } from "../kit/units/length-text.tsx";

/** Fetches the lot. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  await queryClient.ensureQueryData(lotQueries.one(params["tag"] ?? ""));
  return null;
}

/** A lot: what it is, its certificates and where it went. */
export default function LotPage(): ReactElement {
  const { data: lot } = useSuspenseQuery(lotQueries.one(useParams()["tag"] ?? ""));
  const mayWrite = useMay("lots:write");
  const facts = [
    { key: "Kind", value: KIND_WORDS[lot.kind] },
    { key: "Grade", value: lot.grade },
    { key: "Supplier", value: lot.supplier },
    ...(lot.dimension === null
      ? []
      : [{ key: "Size", value: <span className="figures">{lot.dimension}</span> }]),
    ...(lot.thickness_mm === null
      ? []
      : [{ key: "Thickness", value: <LengthText length_mm={lot.thickness_mm} decimals={1} /> }]),
    { key: "Amount", value: <span className="figures">{`${lot.quantity} ${lot.unit}`}</span> },
    { key: "Came in", value: <DayText day={lot.received_on} /> },
    { key: "Seams it is in", value: <span className="figures">{lot.seam_count}</span> },
  ];
  return (
    <>
      <PageHead
        title={`${numberWord(lot.kind)} ${lot.number}`}
        above={<Breadcrumbs trail={[{ to: PATHS.lots.path, label: "Lots" }]} />}
        state={<StateMark state={lot.state} />}
        facts={
          <>
            {KIND_WORDS[lot.kind]} {lot.grade} · {lot.supplier} · tag <TagText text={lot.tag} copy />
          </>
        }
        actions={mayWrite ? <LotStateButtons lot={lot} /> : null}
      />
      {lot.note === "" ? null : <p>{lot.note}</p>}
      <SheetGrid>
        <SheetStack>
          <Sheet title="Certificates">
            <Certificates certificates={lot.certificates} />
          </Sheet>
          <Sheet title="Where it went" aside={`${lot.uses.length} uses`} flush>
            <LotUses lot={lot} />
          </Sheet>
        </SheetStack>
        <SheetStack>
          <Sheet title="The lot">
            <KeyValue rows={facts} />
          </Sheet>
          {mayWrite ? (
            <Sheet title="Add a certificate">
              <CertificateForm tag={lot.tag} />
            </Sheet>
          ) : null}
        </SheetStack>
      </SheetGrid>
    </>
  );
}
