/** The part that labels are printed for, as far as labels need it. */
export interface LabelPart {
  readonly tag: string;
  readonly name: string;
  readonly serial: string;
  readonly drawing_number: string;
  readonly drawing_revision: string;
  readonly order_no: string | null;
}

/** A seam of that part. */
export interface LabelSeam {
  readonly tag: string;
  readonly number: string;
  readonly joint_type: string;
  readonly weld_size_mm: number;
}

/** Which labels are wanted: all, the part's, the seams', or the part's with a strip of seam codes. */
export type LabelChoice = "all" | "part" | "seams" | "strip";

/** What one label says. */
export interface Label {
  /** Tag in its code and as text. */
  readonly tag: string;
  /** The word read first: a serial, a seam number. */
  readonly title: string;
  /** Lines below, most important first; the last ones go when there is no room. */
  readonly lines: readonly string[];
  /** Codes of seams that share this label. */
  readonly strip: readonly { readonly tag: string; readonly number: string }[];
}

/** Joints in the shop's words. */
const JOINTS: Readonly<Record<string, string>> = {
  fillet_t: "T joint",
  lap: "Lap joint",
  corner_open: "Corner joint",
  corner_closed: "Corner joint",
  butt_v: "Butt, V",
  butt_half_v: "Butt, half V",
  butt_square: "Butt, square",
};

/** Fillets are sized by their throat a, butt welds by their depth s (ISO 2553). */
const sizeText = (seam: LabelSeam): string =>
  `${JOINTS[seam.joint_type] ?? seam.joint_type}, ${seam.joint_type.startsWith("butt") ? "s" : "a"}${seam.weld_size_mm}`;

const partLabel = (part: LabelPart, strip: Label["strip"]): Label => ({
  tag: part.tag,
  title: part.name,
  lines: [
    `${part.drawing_number} rev ${part.drawing_revision}`,
    ...(part.order_no === null ? [] : [`Order ${part.order_no}`]),
  ],
  strip,
});

const seamLabel = (part: LabelPart, seam: LabelSeam): Label => ({
  tag: seam.tag,
  title: `Seam ${seam.number}`,
  lines: [part.name, sizeText(seam), `${part.drawing_number} rev ${part.drawing_revision}`],
  strip: [],
});

/**
 * The labels of a part and its seams, in the order they are printed: the part first.
 * @param per_strip seam codes that fit under one part label, 1 or more; more seams give more part labels
 */
export function labelsOf(
  part: LabelPart,
  seams: readonly LabelSeam[],
  choice: LabelChoice,
  per_strip = 6,
): Label[] {
  if (choice === "part") return [partLabel(part, [])];
  const seamLabels = seams.map((seam) => seamLabel(part, seam));
  if (choice === "seams") return seamLabels;
  if (choice === "all") return [partLabel(part, []), ...seamLabels];
  const codes = seams.map(({ tag, number }) => ({ tag, number }));
  const strips = Array.from({ length: Math.max(1, Math.ceil(codes.length / per_strip)) }, (_, i) =>
    codes.slice(i * per_strip, (i + 1) * per_strip),
  );
  return strips.map((strip) => partLabel(part, strip));
}

/** A tag grouped for reading: `S-8K3F7Q2NS` as `S 8K3 F7Q 2NS`. */
export function groupedTag(tag: string): string {
  const [kind = "", tail = ""] = tag.split("-");
  return `${kind} ${tail.replaceAll(/(.{3})(?=.)/g, "$1 ")}`;
}
