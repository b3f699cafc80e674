import { planScan } from "@beadroll/domain/measure/plan/plan-scan";
import { type ScanPlan, ScanPlanInput } from "@beadroll/domain/schemas/scan-plan";
import { EXIT } from "../exit-codes.ts";
import { readInput } from "../input/read-input.ts";
import { readModel } from "../input/read-model.ts";
import { type Look, styled } from "../output/look.ts";
import { type CommandOutcome, stop } from "../output/outcome.ts";

/** Options of `plan`, as parsed. */
export interface PlanOptions {
  readonly model: string;
  readonly scanner: string;
  readonly standOff: number;
  readonly travel: number;
  readonly runOff?: number;
}

async function readPlanInput(options: PlanOptions): Promise<ScanPlanInput> {
  const { bytes } = await readInput(options.scanner);
  let scanner: unknown;
  try {
    scanner = JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes));
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof TypeError)) throw error;
    return stop(EXIT.usage, {
      error: "scanner-invalid",
      detail: `${options.scanner}: it is no JSON: ${error.message}`,
    });
  }
  const parsed = ScanPlanInput.safeParse({
    scanner,
    stand_off_mm: options.standOff,
    travel_mm_s: options.travel,
    ...(options.runOff !== undefined && { run_off_mm: options.runOff }),
  });
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map(
    (issue) => `${options.scanner}: /${issue.path.slice(1).map(String).join("/")}: ${issue.message}`,
  );
  return stop(EXIT.usage, { error: "scanner-invalid", detail: lines.join("; ") }, lines.join("\n"));
}

function planText(plan: ScanPlan, look: Look): string {
  const facts: [string, string][] = [
    ["profiles", `${plan.profiles}, ${plan.profile_spacing_mm.toFixed(3)} mm apart`],
    [
      "points",
      `${plan.point_spacing_mm.toFixed(3)} mm apart across, field ${plan.field_width_mm.toFixed(1)} mm`,
    ],
    ["passes", `${plan.passes}, ${plan.points} points in all`],
    ["time", `${plan.time_s.toFixed(1)} s`],
  ];
  return [
    styled(plan.serves ? "■ the plan serves" : "▲ the plan does not serve", look, "bold"),
    ...facts.map(([name, text]) => `  ${name.padEnd(10)}${text}`),
    "",
    ...plan.checks.map((check) => `  ${check.ok ? "■" : "▲"} ${check.text}`),
  ].join("\n");
}

/** Says what a scan will give before it is taken. */
export async function plan(options: PlanOptions, look: Look): Promise<CommandOutcome> {
  const model = await readModel(options.model);
  const found = planScan(model, await readPlanInput(options));
  return { exit: found.serves ? EXIT.done : EXIT.hold, json: found, text: planText(found, look) };
}
