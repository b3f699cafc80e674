import { randomUUID } from "node:crypto";

/** Password of every account of the small shop. */
export const SHOP_PASSWORD = "a-password-for-tests";

/** Asks the API; a refusal is an error. */
export async function ask(
  url: string,
  token: string,
  request: { readonly method?: string; readonly path: string; readonly body?: object },
): Promise<Record<string, unknown>> {
  const answer = await fetch(`${url}/api/v1${request.path}`, {
    method: request.method ?? "GET",
    headers: {
      "Content-Type": "application/json",
      "Idempotency-Key": randomUUID(),
      ...(token && { Authorization: `Bearer ${token}` }),
    },
    ...(request.body && { body: JSON.stringify(request.body) }),
  });
  const value: Record<string, unknown> = await answer.json();
  if (!answer.ok) throw new Error(`${request.path}: ${JSON.stringify(value)}`);
  return value;
}

/** Signs in; the access token. */
export async function signIn(url: string, login: string): Promise<string> {
  const body = { login, password: SHOP_PASSWORD };
  return String((await ask(url, "", { method: "POST", path: "/session", body }))["access_token"]);
}

/** A T joint along x of 20 mm, as the model. */
export function smallModel(): object {
  const vertices = Array.from({ length: 11 }, (_, i) => ({
    station_mm: i * 2,
    point: [i * 2, 50, 0],
    tangent: [1, 0, 0],
    lateral: [0, 1, 0],
    normal: [0, 0, 1],
  }));
  return {
    case: "small-t-joint",
    joint_type: "fillet_t",
    seam: { length_mm: 20, closed: false, vertices },
    section: {
      plate_a: { thickness_mm: 10 },
      plate_b: { thickness_mm: 6, height_mm: 20 },
      gap_mm: 0,
      included_angle_deg: 90,
    },
  };
}

/**
 * A scan of that joint as XYZ text; each number gives other bytes.
 * @param lateral_mm how far the upright stands off
 */
export function smallScan(number: number, lateral_mm = 0): string {
  const lines = ["x_mm,y_mm,z_mm"];
  for (let x = 0; x <= 20; x += 1)
    for (let d = 0.5; d <= 14; d += 0.4) {
      const noise = 0.01 * Math.sin(number * 7.77 + x * 3.1 + d * 11.3);
      lines.push(
        `${x},${(50 + lateral_mm - d).toFixed(3)},${noise.toFixed(5)}`,
        `${x},${(50 + lateral_mm + noise).toFixed(5)},${d.toFixed(3)}`,
      );
    }
  return `${lines.join("\n")}\n`;
}

/** What the small shop gives to a test. */
export interface SmallShop {
  readonly key: string;
  readonly reading_key: string;
  readonly part: string;
  readonly seams: readonly string[];
}

/** Fills an empty server whose administrator is "chief": a drawing, a part with seams, an auditor, a cell's key. */
export async function setUpShop(url: string, seamCount: number): Promise<SmallShop> {
  const administrator = await signIn(url, "chief");
  const post = (token: string, path: string, body: object) => ask(url, token, { method: "POST", path, body });
  for (const role of ["coordinator", "auditor"])
    await post(administrator, "/users", { login: role, name: role, roles: [role], password: SHOP_PASSWORD });
  const writing = await post(administrator, "/keys", {
    name: "Cell PC",
    scopes: ["records:read", "scans:write", "passes:write"],
  });
  const reading = await post(administrator, "/keys", { name: "Wall screen", scopes: ["records:read"] });
  const coordinator = await signIn(url, "coordinator");
  const drawing = await post(coordinator, "/drawings", { number: "FW-1", revision: "A", title: "Frame" });
  for (let i = 1; i <= seamCount; i += 1)
    await post(coordinator, `/drawings/${drawing["id"]}/model-seams`, {
      number: `S${i}`,
      sequence: i,
      weld_size_mm: 5,
      quality_level: "C",
      model: smallModel(),
    });
  const part = await post(coordinator, "/parts", { drawing_id: drawing["id"], serial: "0001" });
  const roll = part["roll"] as { tag: string }[];
  return {
    key: String(writing["secret"]),
    reading_key: String(reading["secret"]),
    part: String(part["tag"]),
    seams: roll.map((seam) => seam.tag),
  };
}
