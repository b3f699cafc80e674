import type { Lot, LotPage } from "@beadroll/domain/schemas/lot";

/** Kinds of lot in words. */
export const KIND_WORDS: Readonly<Record<Lot["kind"], string>> = {
  plate: "Plate",
  section: "Section",
  tube: "Tube",
  wire: "Wire",
  gas: "Gas",
  flux: "Flux",
};

/** What a lot's number is called. */
export const numberWord = (kind: Lot["kind"]): string =>
  ["plate", "section", "tube"].includes(kind) ? "Heat" : "Lot";

/** The states a lot can be brought into from where it is, with the word for the deed. */
export function nextStates(state: Lot["state"]): { readonly state: Lot["state"]; readonly deed: string }[] {
  const deeds: Readonly<Record<Lot["state"], string>> = {
    received: "Set back to received",
    released: "Release",
    quarantined: "Quarantine",
    used_up: "Close as used up",
  };
  const from: Readonly<Record<Lot["state"], readonly Lot["state"][]>> = {
    received: ["released", "quarantined"],
    released: ["quarantined", "used_up"],
    quarantined: ["released"],
    used_up: ["released"],
  };
  return from[state].map((next) => ({ state: next, deed: deeds[next] }));
}

/** What a change of state touches, in numbers. */
export function reachWords(lot: LotPage): string {
  const parts = lot.uses.filter((use) => use.kind === "piece").length;
  const mounted = lot.uses.filter((use) => use.kind === "mount" && use.to_at === null).length;
  const seams = lot.seam_count === 1 ? "1 seam" : `${lot.seam_count} seams`;
  const built = parts === 1 ? "1 piece" : `${parts} pieces`;
  return `It is in ${seams}, built in as ${built}${mounted > 0 ? `, and mounted on ${mounted === 1 ? "1 cell" : `${mounted} cells`} now` : ""}.`;
}
