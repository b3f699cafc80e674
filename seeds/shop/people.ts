import type { QualificationCreate } from "@beadroll/domain/schemas/person";
import { type Calendar, dayOf, instantOf } from "../calendar.ts";
import { DEMO_ACCOUNTS, DEMO_KEYS, type DemoAccount } from "../demo-accounts.ts";
import { type PlannedEvent, SETUP_ACTOR } from "../demo-event.ts";
import { CELLS } from "./cells.ts";

const ADMINISTRATOR = DEMO_ACCOUNTS[0].login;
const COORDINATOR = DEMO_ACCOUNTS[1].login;

/** Working hour after which the third operator's qualification has lapsed. */
export const LAPSE_HOUR = 199;

interface Held {
  readonly person: string;
  readonly number: string;
  readonly process: string;
  readonly range: string;
  /** Days from the scenario's end to the last day of validity; null: the day of {@link LAPSE_HOUR}. */
  readonly days_left: number | null;
}

const ROBOT_RANGE = "Robot, single and multi-run, t 3 to 24 mm";

/** One operator in order, one whose right to weld ends within days, one whose right has ended. */
const QUALIFICATIONS: readonly Held[] = [
  { person: "person-varga", number: "Q-2214", process: "135", range: ROBOT_RANGE, days_left: 468 },
  { person: "person-varga", number: "Q-2215", process: "136", range: ROBOT_RANGE, days_left: 468 },
  { person: "person-varga", number: "Q-2216", process: "138", range: ROBOT_RANGE, days_left: 103 },
  { person: "person-castell", number: "Q-2187", process: "135", range: ROBOT_RANGE, days_left: 9 },
  { person: "person-castell", number: "Q-2188", process: "136", range: ROBOT_RANGE, days_left: 9 },
  { person: "person-castell", number: "Q-2189", process: "138", range: ROBOT_RANGE, days_left: 9 },
  { person: "person-halvorsen", number: "Q-2140", process: "135", range: ROBOT_RANGE, days_left: null },
];

const SIX_YEARS_DAYS = 2190;

/** People, accounts, cells and their computers' keys: made one after another when the program is set up. */
export function peopleEvents(calendar: Calendar): PlannedEvent[] {
  const start_ms = calendar.at(0) - 26 * 3_600_000;
  let step = 0;
  const next = () => {
    step += 1;
    return start_ms + step * 95_000;
  };
  return [
    ...DEMO_ACCOUNTS.flatMap((account, i) =>
      accountEvents(account, i === 0 ? SETUP_ACTOR : ADMINISTRATOR, next),
    ),
    ...QUALIFICATIONS.map((held) => qualificationEvent(held, calendar, next())),
    ...CELLS.map(({ ref, fields }): PlannedEvent => {
      const at_ms = next();
      return { at_ms, make: () => ({ kind: "cell", at: instantOf(at_ms), by: ADMINISTRATOR, ref, fields }) };
    }),
    ...DEMO_KEYS.map((key): PlannedEvent => {
      const at_ms = next();
      return {
        at_ms,
        make: () => ({
          kind: "key",
          at: instantOf(at_ms),
          by: ADMINISTRATOR,
          ref: key.ref,
          cell: key.cell,
          fields: {
            name: key.name,
            scopes: ["records:read", "scans:write", "passes:write", "mounts:write"],
          },
          secret: key.secret,
        }),
      };
    }),
  ];
}

function accountEvents(account: DemoAccount, by: string, next: () => number): PlannedEvent[] {
  const { person, name, job, login, password, roles } = account;
  const [made_ms, admitted_ms] = [next(), next()];
  return [
    {
      at_ms: made_ms,
      make: () => ({ kind: "person", at: instantOf(made_ms), by, ref: person, fields: { name, job } }),
    },
    {
      at_ms: admitted_ms,
      make: () => ({
        kind: "user",
        at: instantOf(admitted_ms),
        by,
        ref: `user-${login}`,
        person,
        fields: { login, name, roles: [...roles], password },
      }),
    },
  ];
}

function qualificationEvent(held: Held, calendar: Calendar, at_ms: number): PlannedEvent {
  const until_ms = held.days_left === null ? calendar.at(LAPSE_HOUR) : calendar.ends_ms;
  const valid_until = dayOf(until_ms, held.days_left ?? 0);
  const fields: QualificationCreate = {
    standard: "ISO 14732",
    number: held.number,
    process: held.process,
    range: held.range,
    issued_on: dayOf(until_ms, (held.days_left ?? 0) - SIX_YEARS_DAYS),
    valid_until,
  };
  return {
    at_ms,
    make: () => ({
      kind: "qualification",
      at: instantOf(at_ms),
      by: COORDINATOR,
      person: held.person,
      fields,
    }),
  };
}
