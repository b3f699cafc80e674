import { Command, CommanderError, InvalidArgumentError, Option } from "commander";
import { EXIT, EXIT_MEANINGS } from "./exit-codes.ts";
import { failure } from "./output/outcome.ts";
import { look, print, runVerb } from "./run-verb.ts";
import { VERSION } from "./version.ts";

/** Verbs are declared here and loaded when they run: `--help` and `--version` evaluate none of them. */
const program = new Command("beadroll")
  .description(
    "Every robot-welded seam, on the record: the command of the cell's computer and the auditor.\nIt records and advises. It is no safety function: guards, interlocks and the people responsible come first.",
  )
  .version(VERSION, "-V, --version", "print the version")
  .helpOption("-h, --help", "show help")
  .helpCommand("help [verb]", "show help for a verb")
  .showHelpAfterError("See beadroll --help.")
  .configureOutput({ outputError: (text, write) => write(text.replace(/^error: /, "")) })
  .exitOverride()
  .addHelpText("after", `\nExit codes:\n${exitTable()}\n\nMore: docs/guides/cell.md`);

function exitTable(): string {
  return Object.entries(EXIT_MEANINGS)
    .map(([code, meaning]) => `  ${code.padStart(2)}  ${meaning}`)
    .join("\n");
}

const positive = (text: string): number => {
  const value = Number(text);
  if (!(value > 0 && value < Number.POSITIVE_INFINITY))
    throw new InvalidArgumentError(`Expected a number above 0, got "${text}".`);
  return value;
};

const aStep = (text: string): number => {
  const value = positive(text);
  if (value < 0.05) throw new InvalidArgumentError(`Expected 0.05 or more, got "${text}".`);
  return value;
};

const json = (): Option => new Option("--json", "print one JSON value on stdout and nothing else");
const units = (): Option =>
  new Option("--units <unit>", "unit that the scan and its poses are written in")
    .choices(["mm", "in", "m"])
    .default("mm");
const stage = (): Option =>
  new Option("--stage <stage>", "fit-up before welding, or the finished bead")
    .choices(["fitup", "bead"])
    .default("fitup");
const part = ["--part <tag>", "the part that is meant: refused if the seam is on another"] as const;
const poses = [
  "--poses <file>",
  "poses of the profiles; a poses.csv beside them is found by itself",
] as const;
const scan = ["--scan <file>", "profiles (CSV, JSON) or a cloud in the part frame (PLY, PCD, XYZ)"] as const;

program
  .command("evaluate")
  .description("measure a scan against its model, without a server")
  .requiredOption("--model <file>", "the model seam, JSON")
  .requiredOption(...scan)
  .option(...poses)
  .addOption(units())
  .option("--step <mm>", "results every so many mm, 0.05 or more, not at the model's stations", aStep)
  .option("--accuracy <mm>", "the scanner's stated accuracy, as a bound", positive)
  .option("--datum <file>", "datum points that bring the scan into the part frame, JSON")
  .option("--by-plates", "bring the scan into the part frame by its own plates")
  .option("--path <file>", "write the corrected path: .csv, or .json")
  .addOption(stage())
  .option("--size <mm>", "finished bead: throat of a fillet weld, thickness of a butt weld", positive)
  .addOption(
    new Option("--level <level>", "finished bead: quality level of ISO 5817").choices(["B", "C", "D"]),
  )
  .addOption(new Option("--edition <year>", "finished bead: edition of ISO 5817").choices(["2014", "2023"]))
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0 within or adapt, 10 hold, 2 unreadable input

  beadroll evaluate --model nominal.json --scan profiles.csv
  beadroll evaluate --model nominal.json --scan cloud.ply --json | jq .verdict
  beadroll evaluate --model nominal.json --scan cloud.ply --datum datum.json --path path.csv
  beadroll evaluate --model nominal.json --scan bead.ply --stage bead --size 5 --level C

datum.json: [{"nominal": [x, y, z], "measured": [x, y, z]}, …], at least three, mm.
The path is advice for the welding coordinator, no command to a robot.`,
  )
  .action((options) =>
    runVerb(
      async () => (await import("./commands/evaluate.ts")).evaluate(options, look),
      options.json === true,
    ),
  );

program
  .command("plan")
  .description("what a scan of a seam will give with a scanner and a speed, and whether it serves")
  .requiredOption("--model <file>", "the model seam, JSON")
  .requiredOption("--scanner <file>", "the scanner's data, JSON")
  .requiredOption("--stand-off <mm>", "stand-off the scanner is driven at", positive)
  .requiredOption("--travel <mm/s>", "travel speed while scanning", positive)
  .option("--run-off <mm>", "way beyond each end", positive)
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0 the plan serves, 10 it does not, 2 unreadable input

  beadroll plan --model nominal.json --scanner scanner.json --stand-off 170 --travel 100

scanner.json: {"profile_rate_hz": 200, "points_per_profile": 1280, "near_mm": 120, "far_mm": 220,
  "width_near_mm": 60, "width_far_mm": 100}`,
  )
  .action((options) =>
    runVerb(async () => (await import("./commands/plan.ts")).plan(options, look), options.json === true),
  );

program
  .command("enrol")
  .description("keep this computer's server and key, once the server knows the key")
  .requiredOption("--server <url>", "address of the server")
  .requiredOption("--key <key>", "this computer's key; - reads it from standard input")
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0 enrolled, 20 server not reachable, 40 key not known

  beadroll enrol --server https://weld.example --key brk_…
  beadroll enrol --server https://weld.example --key - < key.txt

BEADROLL_SERVER and BEADROLL_KEY come before what is kept. It is kept in the folder BEADROLL_HOME,
by default ~/.config/beadroll, readable by this user alone.`,
  )
  .action((options) =>
    runVerb(async () => (await import("./commands/enrol.ts")).enrol(options), options.json === true),
  );

const push = program
  .command("push")
  .description("record a scan or a pass; kept in the queue until the server has it");
push
  .command("scan")
  .description("record a scan of a seam; answers with the verdict")
  .requiredOption("--seam <tag>", "tag of the seam")
  .requiredOption(...scan)
  .option(...poses)
  .addOption(stage())
  .addOption(units())
  .option("--taken-at <instant>", "when it was taken, with its zone; now if absent")
  .option(...part)
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0 within or adapt, 10 hold, 20 kept in the queue, 30 refused, 40 not allowed

  beadroll push scan --seam S-8K3F7Q2NS --scan profiles.csv
  beadroll push scan --seam S-8K3F7Q2NS --part P-8K3F7Q2NA --scan cloud.ply --stage bead
  beadroll push scan --seam S-8K3F7Q2NS --scan profiles.csv --taken-at 2026-11-30T10:41:07+01:00`,
  )
  .action((options) =>
    runVerb(
      async () => (await import("./commands/push-scan.ts")).pushScan(options, look),
      options.json === true,
    ),
  );
push
  .command("pass")
  .description("record a weld run of a seam with its log; answers with what the log says")
  .requiredOption("--seam <tag>", "tag of the seam")
  .requiredOption("--log <file>", "the log, CSV or JSON")
  .option("--pass <number>", "number of the run in the seam; the next one if absent")
  .option("--operator <tag>", "badge of the operator")
  .option("--started-at <instant>", "when the log begins, with its zone; if absent, it ends now")
  .option("--program <name>", "robot program and version")
  .option(...part)
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0 recorded, 20 kept in the queue, 30 refused, 40 not allowed

  beadroll push pass --seam S-8K3F7Q2NS --log pass-1.csv --operator W-8K3F7Q2NF
  beadroll push pass --seam S-8K3F7Q2NS --log pass-2.csv --pass 2 --program "SKID-S4 v12"`,
  )
  .action((options) =>
    runVerb(
      async () => (await import("./commands/push-pass.ts")).pushPass(options, look),
      options.json === true,
    ),
  );

const queue = program.command("queue").description("what waits on this computer to be sent");
queue
  .command("list", { isDefault: true })
  .description("what waits, oldest first, and what was refused")
  .addOption(json())
  .addHelpText("after", "\n  beadroll queue\n  beadroll queue list --json")
  .action((options) =>
    runVerb(async () => (await import("./commands/queue-list.ts")).listQueue(look), options.json === true),
  );
queue
  .command("send")
  .description("send it now, oldest first")
  .addOption(json())
  .addHelpText(
    "after",
    "\nExit: that of the result that needs somebody most: 40, 20, 1, 30, 10, else 0\n\n  beadroll queue send",
  )
  .action((options) =>
    runVerb(async () => (await import("./commands/queue-send.ts")).sendQueue(look), options.json === true),
  );

program
  .command("find")
  .description("search tags, serials, heats, lots, names, drawings and orders")
  .argument("<text...>", "what to look for")
  .addOption(json())
  .addHelpText(
    "after",
    `
Exit: 0, also when nothing is found

  beadroll find 0418
  beadroll find skid frame 0418
  beadroll find H48812 --json`,
  )
  .action((words: string[], options) =>
    runVerb(async () => (await import("./commands/find.ts")).find(words, look), options.json === true),
  );

try {
  await program.parseAsync();
} catch (error) {
  if (!(error instanceof CommanderError)) throw error;
  // commander ends with 0 for help and version, and with 1 for wrong usage, which is 2 here. It has said its say.
  const isAnswered = error.exitCode === 0;
  const detail = error.message.replace(/^error: /, "");
  process.exitCode = isAnswered ? EXIT.done : EXIT.usage;
  if (!isAnswered && process.argv.includes("--json"))
    print(failure(EXIT.usage, { error: "usage", detail }, ""), true);
}
