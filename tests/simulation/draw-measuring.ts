// Draws the pictures of docs/measuring.md from the measuring itself:
//   npx esbuild tests/simulation/draw-measuring.ts --bundle --platform=node --format=esm | node --input-type=module - docs/pictures
import { writeFileSync } from "node:fs";
import { beadSectionAt } from "@beadroll/domain/measure/bead/bead-section-at";
import { measureBead } from "@beadroll/domain/measure/bead/measure-bead";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { jointFaces } from "@beadroll/domain/measure/joints/joint-faces";
import { measureSeam } from "@beadroll/domain/measure/seam/measure-seam";
import { sectionAt } from "@beadroll/domain/measure/section-at";
import { JOINT_TYPES, type JointType } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";
import { simulateBead } from "./simulate-bead.ts";
import { type Simulated, simulate } from "./simulate-scan.ts";

const INK = "#14181C";
const ASH = "#4E585E";
const LINK = "#1F5A8C";
const BEYOND = "#C8341F";
const BRONZE = "#9C5C36";

type Point = readonly [number, number];

/** A drawing in mm, the normal axis upward. */
function drawing(title: string, box: { l: Point; n: Point; scale: number }, body: string): string {
  const [width, height] = [(box.l[1] - box.l[0]) * box.scale, (box.n[1] - box.n[0]) * box.scale];
  const view = `${box.l[0]} ${-box.n[1]} ${box.l[1] - box.l[0]} ${box.n[1] - box.n[0]}`;
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="${view}" role="img" font-family="Barlow, sans-serif"><title>${title}</title><rect x="${box.l[0]}" y="${-box.n[1]}" width="100%" height="100%" fill="#FFFFFF"/>${body}</svg>\n`;
}

const at = ([l, n]: Point) => `${l.toFixed(3)},${(-n).toFixed(3)}`;
const line = (points: readonly Point[], colour: string, width: number, dash = "") =>
  `<polyline points="${points.map(at).join(" ")}" fill="none" stroke="${colour}" stroke-width="${width}"${dash && ` stroke-dasharray="${dash}"`}/>`;
const dot = ([l, n]: Point, colour: string, radius: number) =>
  `<circle cx="${l.toFixed(3)}" cy="${(-n).toFixed(3)}" r="${radius}" fill="${colour}" stroke="none"/>`;
const cross = ([l, n]: Point, colour: string, size: number) =>
  line(
    [
      [l - size, n],
      [l + size, n],
    ],
    colour,
    size / 5,
  ) +
  line(
    [
      [l, n - size],
      [l, n + size],
    ],
    colour,
    size / 5,
  );
const text = ([l, n]: Point, words: string, size: number, colour = INK, anchor = "start") =>
  `<text x="${l}" y="${-n}" font-size="${size}" fill="${colour}" text-anchor="${anchor}" stroke="none">${words}</text>`;

/** A section as it was measured: points kept and rejected, faces, root. */
function sectionBody(view: SectionView, size: number): string {
  return [
    ...view.model.map((points) => line(points, ASH, size / 2, `${size * 2} ${size}`)),
    ...view.plates.map(({ plate, from, to }) => line([from, to], plate === "a" ? LINK : BRONZE, size)),
    ...view.kept.map((point) => dot(point, INK, size * 0.5)),
    ...view.rejected.map(({ point }) => dot(point, BEYOND, size * 0.55)),
    view.root ? cross(view.root, BEYOND, size * 5) : "",
  ].join("");
}

const sectionOf = (simulated: Simulated, station_mm: number) =>
  sectionAt(measureSeam(simulated.model, simulated.cloud), station_mm);

/** All joint types: the nominal faces, the root, and a clean section measured. */
function definitions(): string {
  const [columns, cell_l, cell_n] = [4, 34, 26];
  const body = JOINT_TYPES.map((joint, i) => {
    const simulated = simulate(joint, 3, 0);
    const view = sectionOf(simulated, (simulated.truth[10] ?? { station_mm: 0 }).station_mm);
    const [column, row] = [i % columns, Math.floor(i / columns)];
    const inner = `${text([-16, 14.5], joint, 1.7)}${sectionBody({ ...view, kept: view.kept.filter(inside) }, 0.28)}${text([0.8, -3.2], "o", 1.5, BEYOND)}`;
    const place = `x="${-17 + column * cell_l}" y="${-18 + row * cell_n}" width="${cell_l}" height="${cell_n}"`;
    return `<svg ${place} viewBox="-17 -18 ${cell_l} ${cell_n}">${inner}</svg>`;
  }).join("");
  const rows = Math.ceil(JOINT_TYPES.length / columns);
  return drawing(
    "The seven joint types, measured",
    { l: [-17, -17 + columns * cell_l], n: [-8 - (rows - 1) * cell_n, 18], scale: 9 },
    body,
  );
}

const inside = ([l, n]: Point) => Math.abs(l) < 15.5 && n < 13.5 && n > -8;

/** One dirty section: what is kept, what is rejected, and what is fitted. */
function dirty(joint: JointType, seed: number): string {
  const simulated = simulate(joint, seed, 1);
  const tacked = simulated.truth.find((station) => station.tack && station.scanned);
  const view = sectionOf(simulated, (tacked ?? { station_mm: 20 }).station_mm);
  const faces = jointFaces(simulated.model).faces.length;
  return drawing(
    `A section under a tack: ${faces} faces fitted beside it`,
    { l: [-20, 20], n: [-18, 18], scale: 20 },
    sectionBody(view, 0.18),
  );
}

/** How far the lateral deviation is from the truth along a seam: single sections, and the settled value with U. */
function along(): string {
  const simulated = simulate("corner_open", 2, 1);
  const outcome = evaluateScan(simulated.model, simulated.cloud);
  const seam = measureSeam(simulated.model, simulated.cloud);
  if (!outcome.ok) throw new Error("the example cannot be measured");
  const truthAt = (s_mm: number) => {
    const next = simulated.truth.findIndex((one) => one.station_mm >= s_mm);
    const [a, b] = [simulated.truth[Math.max(0, next - 1)], simulated.truth[Math.max(0, next)]];
    if (!a || !b) return 0;
    const share = b.station_mm > a.station_mm ? (s_mm - a.station_mm) / (b.station_mm - a.station_mm) : 0;
    return a.lateral_mm + share * (b.lateral_mm - a.lateral_mm);
  };
  const last = simulated.truth.at(-1)?.station_mm ?? 0;
  const scale = 1.6 * last;
  const off = (s_mm: number, value: number): Point => [s_mm, (value - truthAt(s_mm)) * scale];
  const measured = outcome.value.stations.filter((s) => s.measured);
  const band = (side: number) =>
    measured.map((s) => off(s.station_mm, (s.lateral_mm ?? 0) + side * 2 * (s.u_lateral_mm ?? 0)));
  const size = last / 100;
  const grid = [-0.1, -0.05, 0, 0.05, 0.1].map(
    (mm) =>
      line(
        [
          [0, mm * scale],
          [last, mm * scale],
        ],
        "#D9D6CC",
        size / 8,
      ) + text([-size, mm * scale - size * 0.7], mm.toFixed(2), 2 * size, ASH, "end"),
  );
  const singles = seam.outcomes.flatMap((one, i) => {
    const s_mm = seam.slices.at_mm[i] ?? 0;
    return one.found && s_mm >= 0 && s_mm <= last
      ? dot(off(s_mm, one.result.at.lateral_mm), ASH, size * 0.4)
      : [];
  });
  const body = [
    ...grid,
    `<polygon points="${[...band(1), ...band(-1).reverse()].map(at).join(" ")}" fill="${LINK}" opacity="0.2" stroke="none"/>`,
    ...singles,
    line(band(0), LINK, size * 0.4),
    text(
      [0, 0.13 * scale],
      "error of the lateral deviation, mm: single sections (dots), settled value and U, k = 2 (line, band)",
      2 * size,
      ASH,
    ),
  ].join("");
  return drawing(
    "Error of the lateral deviation along a seam",
    { l: [-8 * size, last + 2 * size], n: [-0.16 * scale, 0.16 * scale], scale: 900 / (110 * size) },
    body,
  );
}

/** A finished fillet with an undercut, as it was measured. */
function finished(seed: number): string {
  const { model, cloud, weld_size_mm, truth } = simulateBead("fillet_t", seed, 0.2, { throat_mm: 5 });
  const cut = truth.find(({ undercut_a_mm }) => undercut_a_mm > 0.4) ?? truth[10];
  const view = beadSectionAt(measureBead(model, cloud, weld_size_mm), cut?.station_mm ?? 20);
  const size = 0.14;
  const [toeA, toeB] = view.toes ?? [];
  const toes = [toeA, toeB].flatMap((toe) => (toe ? [cross(toe, BRONZE, 0.7)] : []));
  const chord = toeA && toeB ? line([toeA, toeB], ASH, size / 2, `${size * 3} ${size * 2}`) : "";
  const root = view.root ?? [0, 0];
  const words = [
    ...(toeA ? [text([toeA[0], toeA[1] - 1.6], "toe on plate A", 0.9, INK, "middle")] : []),
    ...(toeB ? [text([toeB[0] + 0.9, toeB[1]], "toe on plate B", 0.9)] : []),
    text([root[0] + 0.9, root[1] - 0.3], "root, constructed", 0.9),
  ];
  return drawing(
    "Section of a finished fillet weld with its parent faces, toes and root",
    { l: [-16, 10], n: [-4, 15], scale: 26 },
    sectionBody({ ...view, model: [] }, size) + chord + toes.join("") + words.join(""),
  );
}

const folder = process.argv[2] ?? "docs/pictures";
writeFileSync(`${folder}/joint-types.svg`, definitions());
writeFileSync(`${folder}/section-under-tack.svg`, dirty("corner_open", 3));
writeFileSync(`${folder}/along-the-seam.svg`, along());
writeFileSync(`${folder}/finished-fillet.svg`, finished(3));
