import { createHash } from "node:crypto";
import { Readable } from "node:stream";
import { type DemoEvent, type DemoFile, SETUP_ACTOR } from "@beadroll/seeds/demo-event";
import { demoEvents } from "@beadroll/seeds/demo-scenario";
import { createCell, mountLot } from "../cells/cells.service.ts";
import type { Deps } from "../deps.ts";
import { createDrawing, createModelSeam } from "../drawings/drawings.service.ts";
import { recordFile } from "../files/files.store.ts";
import type { ReceivedFile } from "../http/multipart.ts";
import { recordInspection } from "../inspections/inspections.service.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { readLot } from "../lots/lots.read.ts";
import { addCertificate, createLot, patchLot } from "../lots/lots.service.ts";
import { addPiece, createPart } from "../parts/parts.service.ts";
import { recordPass } from "../passes/passes.service.ts";
import { addQualification, createPerson } from "../people/people.service.ts";
import { createProcedure, patchProcedure, readProcedure } from "../procedures/procedures.service.ts";
import { evaluationOf, type PushedScan, recordScan } from "../scans/scans.service.ts";
import { createKey, createUser } from "../users/users.service.ts";
import { lookingAhead, measuringAhead } from "./measuring-ahead.ts";
import { type References, references } from "./references.ts";

/** Demo passwords are published, so their hashes need not be slow. */
const DEMO_PASSWORD_COST = 6;

interface Replay {
  readonly deps: Deps;
  readonly refs: References;
  readonly context: ChangeContext;
}

async function keep(deps: Deps, file: DemoFile, media_type: string): Promise<ReceivedFile> {
  const kept = await deps.store.keep(Readable.from([Buffer.from(file.bytes)]));
  return { ...kept, name: file.name, media_type };
}

async function pushedScan(
  { seam, cell, fields, file }: Extract<DemoEvent, { kind: "scan" }>,
  deps: Deps,
  refs: References,
): Promise<PushedScan> {
  return {
    seam_tag: await refs.seamTag(seam),
    fields: {
      ...fields,
      stage: fields.stage ?? "fitup",
      units: fields.units ?? "mm",
      cell_tag: refs.tag(cell),
    },
    scan: await keep(deps, file, "application/octet-stream"),
    poses: null,
  };
}

type Events<Kind extends DemoEvent["kind"]> = Extract<DemoEvent, { kind: Kind }>;

/** One function a kind of event; each calls the service that serves the same request over HTTP. */
const REPLAY: { [Kind in DemoEvent["kind"]]: (event: Events<Kind>, replay: Replay) => Promise<unknown> } = {
  person: async ({ ref, fields }, { refs, context }) => refs.put(ref, await createPerson(context, fields)),
  qualification: ({ person, fields }, { refs, context }) =>
    addQualification(context, refs.tag(person), fields),
  user: async ({ ref, person, fields }, { refs, context }) => {
    const person_id = person === null ? null : refs.id(person);
    refs.put(ref, await createUser(context, { ...fields, person_id }, DEMO_PASSWORD_COST));
  },
  key: async ({ ref, cell, fields, secret }, { refs, context }) => {
    const cell_id = cell === null ? null : refs.id(cell);
    refs.put(ref, await createKey(context, { ...fields, cell_id }, secret));
  },
  cell: async ({ ref, fields }, { refs, context }) => refs.put(ref, await createCell(context, fields)),
  procedure: async ({ ref, fields }, { refs, context }) =>
    refs.put(ref, await createProcedure(context, fields)),
  "procedure-approval": async ({ procedure, fields }, { deps, refs, context }) => {
    const id = refs.id(procedure);
    const { version } = await readProcedure(deps.db.reader, id);
    await patchProcedure(context, id, fields, version);
  },
  drawing: async ({ ref, fields }, { refs, context }) => refs.put(ref, await createDrawing(context, fields)),
  "model-seam": ({ drawing, procedure, fields }, { refs, context }) =>
    createModelSeam(context, refs.id(drawing), {
      ...fields,
      procedure_id: procedure === null ? null : refs.id(procedure),
    }),
  lot: async ({ ref, fields }, { refs, context }) => refs.put(ref, await createLot(context, fields)),
  "lot-state": async ({ lot, fields }, { deps, refs, context }) => {
    const { version } = await readLot(deps.db.reader, refs.tag(lot));
    await patchLot(context, refs.tag(lot), fields, version);
  },
  certificate: async ({ lot, fields, file }, { deps, refs, context }) => {
    const kept = await keep(deps, file, "application/pdf");
    await change(context, "file.store", async (trx) => {
      await recordFile(trx, context.caller, kept);
      return { value: undefined, subjects: [kept.digest] };
    });
    await addCertificate(context, refs.tag(lot), { ...fields, file_digest: kept.digest });
  },
  part: async ({ ref, drawing, parent, fields }, { refs, context }) => {
    const parent_tag = parent === null ? {} : { parent_tag: refs.tag(parent) };
    refs.put(ref, await createPart(context, { ...fields, ...parent_tag, drawing_id: refs.id(drawing) }));
  },
  piece: ({ part, lot, fields }, { refs, context }) =>
    addPiece(context, refs.tag(part), { ...fields, lot_tag: refs.tag(lot) }),
  mount: ({ cell, lot, fields }, { refs, context }) =>
    mountLot(context, { ...fields, cell_tag: refs.tag(cell), lot_tag: refs.tag(lot) }),
  scan: async (event, { deps, refs, context }) =>
    recordScan(deps, context, await pushedScan(event, deps, refs)),
  pass: async ({ seam, cell, operator, fields, file }, { deps, refs, context }) =>
    recordPass(deps, context, {
      seam_tag: await refs.seamTag(seam),
      fields: { ...fields, operator_tag: refs.tag(operator), cell_tag: refs.tag(cell) },
      log: await keep(deps, file, "text/csv"),
    }),
  inspection: async ({ seam, fields }, { refs, context }) =>
    recordInspection(context, await refs.seamTag(seam), { ...fields, note: fields.note ?? "" }),
};

function replayEvent(event: DemoEvent, replay: Replay): Promise<unknown> {
  // The table's type pairs each kind with its own event; the compiler cannot follow that through the index.
  const play = REPLAY[event.kind] as (event: DemoEvent, replay: Replay) => Promise<unknown>;
  return play(event, replay);
}

/** What loading the demo did. */
export interface DemoLoaded {
  readonly events: number;
  readonly digest: string;
}

/**
 * Replays the demo scenario through the services, at the instants it happened, so that every record and ledger entry
 * is real. For an empty database; it is not durable until it ends, and is begun anew if it is cut.
 */
export async function loadDemo(
  base: Omit<Deps, "now">,
  options: {
    readonly seed: number;
    readonly ends_at: string;
    readonly progress: (events: number, at: string) => void;
  },
): Promise<DemoLoaded> {
  let at = options.ends_at;
  const ahead = measuringAhead(base.measure);
  const deps: Deps = { ...base, measure: ahead.pool, now: () => new Date(at) };
  const refs = references(deps.db.reader, SETUP_ACTOR);
  const hash = createHash("sha256");
  let events = 0;
  await deps.db.writer.raw("pragma synchronous = off");
  try {
    const begin = async (event: DemoEvent) => {
      if (event.kind !== "scan" || !refs.has(event.seam.part) || !refs.has(event.cell)) return;
      const pushed = await pushedScan(event, deps, refs);
      ahead.begin((await evaluationOf(deps, await refs.caller(event.by), pushed)).task);
    };
    for await (const event of lookingAhead(demoEvents({ ...options }), begin)) {
      at = event.at;
      const context = {
        writer: deps.db.writer,
        now: deps.now,
        caller: await refs.caller(event.by),
        once: null,
      };
      await replayEvent(event, { deps, refs, context });
      hash.update(`${event.at} ${event.kind}\n`);
      events += 1;
      if (events % 100 === 0) options.progress(events, at);
    }
  } finally {
    await deps.db.writer.raw("pragma wal_checkpoint(truncate)");
    await deps.db.writer.raw("pragma synchronous = full");
  }
  return { events, digest: hash.digest("hex") };
}
