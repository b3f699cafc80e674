import type { PlanCheck, ScanPlan, ScanPlanInput } from "../../schemas/scan-plan.ts";
import { resolveLimits, type SeamModel } from "../../schemas/seam-model.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import { fieldWidth, pointSpacing, profileCount, profileSpacing } from "./scanner.ts";

/** Two profiles a millimetre. Common practice, no source. */
const PROFILE_SPACING_MM = 0.5;

/** A gap wants three points; thick grooves may be scanned coarser. Common practice, no source. */
const POINT_SPACING_MM = 0.1;
const THICK_POINT_SPACING_MM = 0.2;
const THICK_MM = 20;

/** Surfaces are read this far from the root, mm. */
const WINDOW_MM = 10;

/** Points that a face at the root should have. Common practice, no source. */
const FACE_POINTS = 10;

/** Noise of one point of a usual scanner on steel, mm. Common practice, no source. */
const NOISE_MM = 0.03;

/** Neighbouring passes overlap by this, mm. */
const OVERLAP_MM = 5;

const mm = (value: number) => `${Number(value.toFixed(3))} mm`;

/** Extent of the joint in the section that has to be seen: the faces within the window of the root, and the limits both ways. */
function extent(model: SeamModel) {
  const limits = resolveLimits(model.limits).adapt;
  let [left, right, low, high] = [0, 0, 0, 0];
  for (const face of jointFaces(model).faces) {
    // The far edge of a high upright need not be seen.
    if (Math.hypot(face.near[0], face.near[1]) > WINDOW_MM) continue;
    const reach = Math.min(face.length_mm, WINDOW_MM);
    for (const t of [0, reach]) {
      const l = face.near[0] + t * Math.cos(face.direction_rad);
      const n = face.near[1] + t * Math.sin(face.direction_rad);
      left = Math.min(left, l);
      right = Math.max(right, l);
      low = Math.min(low, n);
      high = Math.max(high, n);
    }
  }
  // The line may lie across the section in any direction: its width is taken by the larger side.
  return {
    width_mm: Math.max(right - left, high - low) + 2 * limits.lateral_mm,
    depth_mm: Math.max(right - left, high - low) + 2 * limits.normal_mm,
  };
}

function checksOf(model: SeamModel, plan: ScanPlanInput, passes: number): PlanCheck[] {
  const { scanner, stand_off_mm, travel_mm_s } = plan;
  const limits = resolveLimits(model.limits);
  const faces = jointFaces(model).faces;
  const { width_mm, depth_mm } = extent(model);
  const along = profileSpacing(travel_mm_s, scanner.profile_rate_hz);
  const across = pointSpacing(scanner, stand_off_mm);
  const thick = Math.max(model.section.plate_a.thickness_mm, model.section.plate_b.thickness_mm) > THICK_MM;
  const fine = thick ? THICK_POINT_SPACING_MM : POINT_SPACING_MM;
  const field = fieldWidth(scanner, stand_off_mm);
  const deep = Math.min(stand_off_mm - scanner.near_mm, scanner.far_mm - stand_off_mm) * 2;
  // A face is seen at about 45 degrees: its points lie √2 apart.
  const shortest = Math.min(...faces.slice(0, 2).map((face) => Math.min(face.length_mm, WINDOW_MM)));
  const onFace = Math.floor(shortest / (across * Math.SQRT2));
  const points = Math.max(2, onFace);
  const middle_mm = shortest / 2;
  const u_root = NOISE_MM * Math.sqrt(1 / points + (12 * middle_mm ** 2) / (points * shortest ** 2));
  const tightest = Math.min(limits.within.lateral_mm, limits.within.normal_mm);
  const blur = ((scanner.exposure_ms ?? 0) / 1000) * travel_mm_s;
  const check = (
    name: PlanCheck["check"],
    [value, wanted]: readonly [number, number],
    how: { readonly atMost: boolean; readonly unit?: PlanCheck["unit"]; readonly text: string },
  ): PlanCheck => ({
    check: name,
    ok: how.atMost ? value <= wanted + 1e-9 : value >= wanted - 1e-9,
    value: Math.round(value * 1e4) / 1e4,
    wanted: Math.round(wanted * 1e4) / 1e4,
    unit: how.unit ?? "mm",
    text: how.text,
  });
  return [
    check("profile_spacing", [along, PROFILE_SPACING_MM], {
      atMost: true,
      text: `Profiles lie ${mm(along)} apart, ${mm(PROFILE_SPACING_MM)} at most are wanted.`,
    }),
    check("point_spacing", [across, fine], {
      atMost: true,
      text: `Points lie ${mm(across)} apart across, ${mm(fine)} at most are wanted.`,
    }),
    check("field_width", [field * passes - OVERLAP_MM * (passes - 1), width_mm], {
      atMost: false,
      text: `The field is ${mm(field)} wide in ${passes === 1 ? "one pass" : `${passes} passes`}; the joint with its limits wants ${mm(width_mm)}.`,
    }),
    check("depth", [deep, depth_mm], {
      atMost: false,
      text: `The range about the stand-off is ${mm(deep)} deep; the joint with its limits wants ${mm(depth_mm)}.`,
    }),
    check("stand_off", [Math.min(stand_off_mm - scanner.near_mm, scanner.far_mm - stand_off_mm), 0], {
      atMost: false,
      text: `The stand-off of ${mm(stand_off_mm)} ${deep >= 0 ? "lies in" : "is outside"} the scanner's range of ${mm(scanner.near_mm)} to ${mm(scanner.far_mm)}.`,
    }),
    check("motion_blur", [blur, along / 2], {
      atMost: true,
      text: `The sensor moves ${mm(blur)} while it exposes a profile, half a spacing at most is wanted.`,
    }),
    check("points_on_faces", [onFace, FACE_POINTS], {
      atMost: false,
      unit: "points",
      text: `The shorter face at the root gets about ${onFace} points a profile, ${FACE_POINTS} are wanted.`,
    }),
    check("limit_uncertainty", [2 * u_root, tightest / 4], {
      atMost: true,
      text: `A root would be known to about ${mm(2 * u_root)} (k = 2, single section, ${NOISE_MM} mm noise), a quarter of the tightest limit is ${mm(tightest / 4)}.`,
    }),
  ];
}

/**
 * What scanning a seam will give, and whether it serves: spacing, passes, time, and whether the limits stay inside the
 * field of view. Defaults are common practice and stand beside each check.
 * @throws RangeError where the stand-off gives no field
 */
export function planScan(model: SeamModel, plan: ScanPlanInput): ScanPlan {
  const { scanner, stand_off_mm, travel_mm_s, run_off_mm, approach_s } = plan;
  const field = fieldWidth(scanner, stand_off_mm);
  if (!(field > 0)) throw new RangeError(`stand_off_mm: the field has no width at ${stand_off_mm} mm`);
  const { width_mm } = extent(model);
  const passes =
    field >= width_mm || field <= OVERLAP_MM ? 1 : Math.ceil((width_mm - OVERLAP_MM) / (field - OVERLAP_MM));
  const length_mm = model.seam.length_mm + (model.seam.closed ? 0 : 2 * run_off_mm);
  const profiles = profileCount(length_mm, travel_mm_s, scanner.profile_rate_hz);
  const checks = checksOf(model, plan, passes);
  return {
    profile_spacing_mm: profileSpacing(travel_mm_s, scanner.profile_rate_hz),
    point_spacing_mm: pointSpacing(scanner, stand_off_mm),
    field_width_mm: field,
    profiles,
    passes,
    points: passes * profiles * scanner.points_per_profile,
    time_s: passes * (length_mm / travel_mm_s + approach_s),
    serves: checks.every((check) => check.ok),
    checks,
  };
}
