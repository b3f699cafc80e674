import type { SeamModel } from "../../schemas/seam-model.ts";
import { type NominalProfile, nominalProfile, type SectionPoint } from "./nominal-profile.ts";

/** One straight face of the nominal joint, with its own axis: t along it from its root end, d square to it. */
export interface Face {
  readonly plate: "a" | "b";
  /** Root end and far end, (lateral, normal) in mm. */
  readonly near: SectionPoint;
  readonly far: SectionPoint;
  readonly length_mm: number;
  /** Direction from the root end to the far end, radians in the section. */
  readonly direction_rad: number;
  /** Whether the root is found from this face. */
  readonly forms_root: boolean;
  /** Whether steel goes on past the far end at a corner; the far end of an open plate is only where the drawing stops. */
  readonly far_is_corner: boolean;
}

/** What a plate shows at the root: `face` a face that passes through it, `bevel` a face that ends there, `edge` only an edge. */
export type RootForm = "face" | "bevel" | "edge";

/** The faces of a joint: index 0 and 1 are those nearest the root on plate A and on plate B. */
export interface JointFaces {
  readonly kind: "meeting" | "butt";
  readonly faces: readonly Face[];
  /** Index of each plate's face at the root, of the next one outward (-1: none), and of its longest. */
  readonly root: readonly [a: number, b: number];
  readonly next: readonly [a: number, b: number];
  readonly longest: readonly [a: number, b: number];
  readonly form: readonly [a: RootForm, b: RootForm];
  /** Butt joints: depth of each plate's root edge below its surface, mm. */
  readonly depth_mm: readonly [a: number, b: number];
  readonly gap_mm: number;
  readonly mismatch_mm: number;
  readonly profile: NominalProfile;
  /** Which plate's thickness or height closes the gap's chain of sizes, and that size; null where the gap's edge must be seen. */
  readonly chain: { readonly plate: "a" | "b"; readonly size_mm: number } | null;
}

/** A face of a butt joint this near to square with its surface is an edge face: it looks away from the scanner. */
const STEEP_RAD = (15 * Math.PI) / 180;

/** Shorter faces than this cannot be told from an edge, mm. */
const SHORTEST_FACE_MM = 0.8;

function face(
  plate: "a" | "b",
  near: SectionPoint,
  far: SectionPoint,
  end: { corner: boolean; root: boolean },
): Face {
  const [l, n] = [far[0] - near[0], far[1] - near[1]];
  return {
    plate,
    near,
    far,
    length_mm: Math.hypot(l, n),
    direction_rad: Math.atan2(n, l),
    forms_root: end.root,
    far_is_corner: end.corner,
  };
}

/** A plate's faces outward from the root. */
function outward(plate: "a" | "b", from_root: readonly SectionPoint[]): Face[] {
  return from_root.slice(1).flatMap((far, i) => {
    const near = from_root[i];
    if (!near) return [];
    const made = face(plate, near, far, { corner: i + 2 < from_root.length, root: i === 0 });
    return made.length_mm < SHORTEST_FACE_MM ? [] : [made];
  });
}

/** Butt joints: whether a face stands so square to the plate's surface that a scanner above sees its edge only. */
function isEdgeFace(candidate: Face, surface: Face): boolean {
  const turn = Math.abs(candidate.direction_rad - surface.direction_rad) % Math.PI;
  return Math.abs(turn - Math.PI / 2) < STEEP_RAD;
}

interface PlateFaces {
  readonly faces: readonly Face[];
  readonly form: RootForm;
  readonly depth_mm: number;
}

function buttPlate(plate: "a" | "b", from_root: readonly SectionPoint[]): PlateFaces {
  const all = outward(plate, from_root);
  const surface = all.at(-1);
  if (!surface) return { faces: [], form: "edge", depth_mm: 0 };
  const faces = all.filter((one) => one === surface || !isEdgeFace(one, surface));
  const rooted = faces.map((one, i) => ({ ...one, forms_root: i === 0 }));
  return { faces: rooted, form: faces.length > 1 ? "bevel" : "edge", depth_mm: surface.near[1] };
}

function longestOf(faces: readonly Face[], plate: "a" | "b"): number {
  let best = -1;
  faces.forEach((one, i) => {
    if (one.plate === plate && (best < 0 || one.length_mm > (faces[best]?.length_mm ?? 0))) best = i;
  });
  return best;
}

function assembled(
  model: SeamModel,
  kind: JointFaces["kind"],
  plates: readonly [PlateFaces, PlateFaces],
  rest: Pick<JointFaces, "profile" | "chain">,
): JointFaces {
  const [a, b] = plates;
  const [rootA, ...outerA] = a.faces;
  const [rootB, ...outerB] = b.faces;
  const faces = [rootA, rootB, ...outerA, ...outerB].filter((one) => one !== undefined);
  const after = (own: readonly Face[], from: number) => (own.length > 0 ? from : -1);
  return {
    kind,
    faces,
    root: [0, 1],
    next: [after(outerA, 2), after(outerB, 2 + outerA.length)],
    longest: [longestOf(faces, "a"), longestOf(faces, "b")],
    form: [a.form, b.form],
    depth_mm: [a.depth_mm, b.depth_mm],
    gap_mm: model.section.gap_mm ?? 0,
    mismatch_mm: model.section.mismatch_mm ?? 0,
    ...rest,
  };
}

/** The far edge of an upright, where its height is known: the gap can be found from it. */
function withTopEdge(model: SeamModel, plate_b: readonly SectionPoint[]): readonly SectionPoint[] {
  const { height_mm, thickness_mm } = model.section.plate_b;
  const [foot, head] = plate_b;
  if (height_mm === undefined || plate_b.length !== 2 || !foot || !head) return plate_b;
  const [l, n] = [head[0] - foot[0], head[1] - foot[1]];
  const length_mm = Math.hypot(l, n);
  if (Math.abs(length_mm - height_mm) > 0.5) return plate_b;
  return [foot, head, [head[0] + (thickness_mm * n) / length_mm, head[1] - (thickness_mm * l) / length_mm]];
}

/** The faces of a model's nominal joint. */
export function jointFaces(model: SeamModel): JointFaces {
  const profile = nominalProfile(model);
  const fromRootA = [...profile.plate_a].reverse();
  const { plate_a, plate_b } = model.section;
  switch (model.joint_type) {
    case "butt_v":
    case "butt_half_v":
    case "butt_square":
      return assembled(model, "butt", [buttPlate("a", fromRootA), buttPlate("b", profile.plate_b)], {
        profile,
        chain: null,
      });
    default: {
      const isCorner = model.joint_type === "corner_open";
      const size_mm = isCorner
        ? plate_a.thickness_mm
        : model.joint_type === "lap"
          ? plate_b.thickness_mm
          : plate_b.height_mm;
      const bs = isCorner ? profile.plate_b : withTopEdge(model, profile.plate_b);
      const plates: [PlateFaces, PlateFaces] = [
        { faces: outward("a", fromRootA), form: "face", depth_mm: 0 },
        { faces: outward("b", bs), form: "face", depth_mm: 0 },
      ];
      return assembled(model, "meeting", plates, {
        profile,
        chain: size_mm === undefined ? null : { plate: isCorner ? "a" : "b", size_mm },
      });
    }
  }
}
