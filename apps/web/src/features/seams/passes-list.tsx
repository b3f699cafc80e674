import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { SeamPage } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { pathTo } from "../../app/paths.ts";
import { Button } from "../../kit/actions/button.tsx";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { lotsOfPass, qualificationWords } from "./seam-words.ts";
import { saveStoredFile } from "./stored-file.ts";

const JUDGED = {
  inside: { tone: "good", word: "Inside the procedure" },
  doubtful: { tone: "attend", word: "Doubtful" },
  outside: { tone: "stop", word: "Outside the procedure" },
} as const;

const heat = (value: number | null): string => (value === null ? "not known" : `${value.toFixed(2)} kJ/mm`);

function Operator(props: { pass: PassRecord }): ReactElement {
  const { pass } = props;
  const { ok, text } = qualificationWords(pass);
  return (
    <span>
      {pass.operator_name !== null && pass.operator_tag !== null ? (
        <TagText text={pass.operator_name} to={pathTo("person", { tag: pass.operator_tag })} />
      ) : null}{" "}
      {ok ? <span className="text-ash">{text}</span> : <StateMark tone="attend" word={text} />}
    </span>
  );
}

function Lots(props: { page: SeamPage; pass: PassRecord; slot: string }): ReactElement {
  const lots = lotsOfPass(props.page, props.pass.id).find(({ slot }) => slot === props.slot)?.lots ?? [];
  return (
    <span>
      {lots.map((lot, index) => (
        <span key={`${lot.lot_tag} ${lot.from_at}`}>
          {index === 0 ? "" : ", then "}
          <TagText text={lot.lot_number} to={pathTo("lot", { tag: lot.lot_tag })} />{" "}
          <span className="text-ash">{lot.grade}</span>
        </span>
      ))}
    </span>
  );
}

function Pass(props: { page: SeamPage; pass: PassRecord }): ReactElement {
  const { page, pass } = props;
  const { result } = pass;
  const judged = result.judgement === null ? null : JUDGED[result.judgement.verdict];
  const rows = [
    { key: "Procedure", value: pass.procedure_name ?? "none" },
    { key: "Operator", value: <Operator pass={pass} /> },
    { key: "Cell", value: pass.cell_name ?? "not named" },
    ...lotsOfPass(page, pass.id).map(({ slot }) => ({
      key: slot === "wire" ? "Wire" : slot === "gas" ? "Gas" : "Flux",
      value: <Lots page={page} pass={pass} slot={slot} />,
    })),
    {
      key: "Heat input, mean values",
      value: <span className="figures">{heat(result.heat_input_kj_mm)}</span>,
    },
    {
      key: "Heat input, each sample",
      value: <span className="figures">{heat(result.heat_input_instant_kj_mm)}</span>,
    },
    { key: "Arc burned", value: <span className="figures">{result.arc_on_s.toFixed(1)} s</span> },
    { key: "Arc struck again", value: <span className="figures">{result.restarts.length}</span> },
    { key: "Welded", value: <InstantText at={pass.started_at} /> },
    ...(pass.program === null
      ? []
      : [{ key: "Program", value: <span className="figures">{pass.program}</span> }]),
    {
      key: "Log",
      value: (
        <Button kind="quiet" onClick={() => void saveStoredFile(pass.file_digest, pass.file_name)}>
          {pass.file_name}
        </Button>
      ),
    },
  ];
  return (
    <article className="grid gap-2 border-t border-rule pt-3 first:border-t-0 first:pt-0">
      <h3 className="flex flex-wrap items-baseline gap-x-4 text-base">
        Pass {pass.pass_number}
        {pass.attempt > 1 ? `, repair ${pass.attempt - 1}` : ""}
        {judged === null ? (
          <StateMark tone="none" word="No procedure to judge by" />
        ) : (
          <StateMark {...judged} />
        )}
      </h3>
      {result.judgement?.reasons.map((reason) => (
        <p key={reason.detail}>{reason.detail}</p>
      ))}
      <KeyValue rows={rows} columns={2} />
    </article>
  );
}

/** The weld runs of a seam with what they were made with. */
export function PassesList(props: { page: SeamPage }): ReactElement {
  const { passes } = props.page;
  if (passes.length === 0)
    return <p className="text-ash">Not welded yet. The cell's computer records each run with its log.</p>;
  return (
    <div className="grid gap-4">
      {passes.map((pass) => (
        <Pass key={pass.id} page={props.page} pass={pass} />
      ))}
    </div>
  );
}
