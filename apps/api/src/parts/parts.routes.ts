import * as contracts from "@beadroll/domain/contract/parts.contract";
import { z } from "zod";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { renderLabels } from "../labels/render-labels.ts";
import { listParts, readPartPage } from "./parts.read.ts";
import { addPiece, createPart } from "./parts.service.ts";

const Remembered = z.object({ part_tag: z.string() });

/** Parts, their pieces and their labels. */
export function partRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listParts, ({ query }) => listParts(reader, query)),
    route(
      contracts.createPart,
      (input) => createPart(changeContext(deps, input), input.body),
      (remembered) => readPartPage(reader, Remembered.parse(remembered).part_tag),
    ),
    route(contracts.getPart, ({ params }) => readPartPage(reader, params.tag)),
    route(contracts.addPiece, (input) => addPiece(changeContext(deps, input), input.params.tag, input.body)),
    route(contracts.printLabels, async ({ params, query }) => {
      const part = await readPartPage(reader, params.tag);
      const stream = await renderLabels({ public_url: deps.public_url, ...query, part, seams: part.roll });
      const file_name = `labels-${part.tag}.pdf`;
      return { stream, media_type: "application/pdf", file_name, inline: true };
    }),
  ];
}
