import { describe, expect, test } from "vitest";
import type { Fault } from "../faults/fault.ts";
import type { PassLog } from "./pass-log.ts";
import { PASS_LOG_BYTES_MAX, readPassLog } from "./read-pass-log.ts";

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

function read(text: string): PassLog {
  const outcome = readPassLog({ name: "pass-1.csv", bytes: bytesOf(text) });
  if (!outcome.ok) throw new Error(outcome.faults.map((fault) => fault.detail).join(" "));
  return outcome.value;
}

function faultsOf(text: string): readonly Fault[] {
  const outcome = readPassLog({ name: "pass-1.csv", bytes: bytesOf(text) });
  return outcome.ok ? [] : outcome.faults;
}

const GOOD = "time_s,current_a,voltage_v\n0,0,0\n0.1,250,27.5\n0.2,252,27.4\n";

describe("reading a log as CSV", () => {
  test("reads columns by name, in any order, passing over those it does not know", () => {
    const log = read("Voltage_V, state ,time_s,CURRENT_A\n0,idle,0,0\n27.5,weld,0.1,250\n");
    expect([...log.times_s]).toEqual([0, 0.1]);
    expect([...log.readings.current_a]).toEqual([0, 250]);
    expect([...log.readings.voltage_v]).toEqual([0, 27.5]);
    expect(log.readings.travel_mm_s).toBeNull();
    expect(log.interpass_c).toBeNull();
  });

  test("takes semicolons with decimal commas, tabs, quotes, comments, a byte order mark and CRLF", () => {
    const semicolons = read(
      "\ufeff# cell C2, füllen\r\ntime_s;current_a;voltage_v\r\n0,0;0;0\r\n\r\n0,1;250,5;27,5\r\n",
    );
    expect([...semicolons.readings.current_a]).toEqual([0, 250.5]);
    const tabs = read('"time_s"\t"current_a"\t"voltage_v"\n"0"\t"0"\t"0"\n0,1\t250.5\t2.75e1');
    expect([...tabs.readings.voltage_v]).toEqual([0, 27.5]);
    const trailing = read("time_s;current_a;voltage_v\n0;0;0;\n0,1;250;27;\n");
    expect([...trailing.times_s]).toEqual([0, 0.1]);
  });

  test("converts units to those of the record", () => {
    const log = read(
      "time_ms,current_a,voltage_v,wire_feed_mm_s,travel_mm_min\n0,200,25,150,360\n500,200,25,150,360\n",
    );
    expect(log.times_s[1]).toBeCloseTo(0.5, 12);
    expect(log.readings.wire_feed_m_min?.[0]).toBeCloseTo(9, 12);
    expect(log.readings.travel_mm_s?.[0]).toBeCloseTo(6, 12);
    const cm = read("time_s,current_a,voltage_v,travel_cm_min\n0,200,25,36\n1,200,25,36\n");
    expect(cm.readings.travel_mm_s?.[1]).toBeCloseTo(6, 12);
    const inches = read(
      "time_s,current_a,voltage_v,travel_in_min,wire_feed_in_min\n0,200,25,10,300\n1,200,25,10,300\n",
    );
    expect(inches.readings.travel_mm_s?.[1]).toBeCloseTo(4.2333, 4);
    expect(inches.readings.wire_feed_m_min?.[1]).toBeCloseTo(7.62, 12);
  });

  test("leaves a reading out where the cell of an optional column is empty", () => {
    const log = read("time_s,current_a,voltage_v,interpass_c\n0,0,0,118\n1,200,25,\n2,200,25,NaN\n");
    expect([...(log.interpass_c ?? [])]).toEqual([118, Number.NaN, Number.NaN]);
  });

  test("drops the sign that polarity gives current and voltage", () => {
    const log = read("time_s,current_a,voltage_v\n0,-150,-12\n1,-150,-12\n");
    expect(log.readings.current_a[0]).toBe(150);
    expect(log.readings.voltage_v[0]).toBe(12);
  });

  test("reads a long log whole", () => {
    const rows = Array.from({ length: 100_000 }, (_, i) => `${i / 1000},${200 + (i % 7)},25.5`);
    const log = read(`time_s,current_a,voltage_v\n${rows.join("\n")}`);
    expect(log.times_s).toHaveLength(100_000);
    expect(log.times_s.at(-1)).toBe(99.999);
    expect(log.readings.current_a.at(-1)).toBe(200 + (99_999 % 7));
  });
});

describe("refusing a CSV log", () => {
  test("with text in a number column, naming line, column and what stands there", () => {
    expect(faultsOf("# c\ntime_s,current_a,voltage_v\n0,0,0\n0.1,füll,27\n0.2,200,0x10\n")).toEqual([
      {
        code: "file-value-invalid",
        detail: 'Expected a number in column 2, current_a, got "füll".',
        line: 4,
        field: "current_a",
      },
      {
        code: "file-value-invalid",
        detail: 'Expected a number in column 3, voltage_v, got "0x10".',
        line: 5,
        field: "voltage_v",
      },
    ]);
  });

  test("with every missing column named", () => {
    expect(
      faultsOf("current_a,gas_l_min\n1,2\n").map(({ code, field, line }) => [code, field, line]),
    ).toEqual([
      ["file-column-missing", "time_s", 1],
      ["file-column-missing", "voltage_v", 1],
    ]);
  });

  test("with no column known, or one quantity twice", () => {
    expect(faultsOf("a,b,c\n1,2,3\n")[0]).toMatchObject({ code: "file-header-invalid", line: 1 });
    expect(faultsOf("0.1,250,27.5\n0.2,251,27\n")[0]?.code).toBe("file-header-invalid");
    expect(faultsOf("time_s,time_ms,current_a,voltage_v\n0,0,0,0\n")[0]).toMatchObject({
      code: "file-header-invalid",
      field: "time_ms",
    });
  });

  test("whose last row is cut, naming its line", () => {
    expect(faultsOf(`${GOOD}0.3,25`)).toEqual([
      {
        code: "file-truncated",
        detail: "The last row has 2 of 3 cells and no line end: the file was cut.",
        line: 5,
      },
    ]);
    expect(faultsOf(`${GOOD}0.3,251,`)[0]).toMatchObject({
      code: "file-truncated",
      line: 5,
      field: "voltage_v",
    });
  });

  test("with a row too short or too long in its middle", () => {
    expect(faultsOf(`${GOOD}0.3,251\n0.4,252,27\n`)[0]).toMatchObject({
      code: "file-value-invalid",
      line: 5,
    });
    expect(faultsOf("time_s,current_a,voltage_v\n0,0,200,0,25,0\n")[0]?.detail).toContain(
      "Decimal commas need",
    );
  });

  test("whose clock runs backwards, at the line where it does", () => {
    expect(faultsOf(`${GOOD}0.05,250,27\n0.06,250,27\n`)).toEqual([
      {
        code: "log-clock-reset",
        detail: "Time goes back from 0.2 s to 0.05 s: the clock was set, or two recordings were joined.",
        line: 5,
      },
    ]);
  });

  test("that is empty, or has a header or one sample only", () => {
    expect(faultsOf("")[0]?.code).toBe("file-empty");
    expect(faultsOf(" \n\n")[0]?.code).toBe("file-empty");
    expect(faultsOf("# nothing\n")[0]?.code).toBe("file-empty");
    expect(faultsOf("time_s,current_a,voltage_v\n")[0]?.code).toBe("file-empty");
    expect(faultsOf("time_s,current_a,voltage_v\n0,0,0\n")[0]?.code).toBe("file-truncated");
  });

  test("that is no text", () => {
    const outcome = readPassLog({ name: "pass-1.xlsx", bytes: Uint8Array.of(0x50, 0x4b, 3, 4, 0, 0, 8) });
    expect(outcome.ok ? [] : outcome.faults.map((fault) => fault.code)).toEqual(["file-format-unknown"]);
  });

  test("that is larger than a log may be, without reading it", () => {
    const outcome = readPassLog({ name: "pass-1.csv", bytes: new Uint8Array(PASS_LOG_BYTES_MAX + 1) });
    expect(outcome.ok ? [] : outcome.faults.map((fault) => fault.code)).toEqual(["file-too-large"]);
  });

  test("with up to twenty faults, not hundreds", () => {
    const rows = Array.from({ length: 300 }, () => "x,y,z");
    expect(faultsOf(`time_s,current_a,voltage_v\n${rows.join("\n")}`).length).toBeLessThanOrEqual(22);
  });
});

describe("reading a log as JSON", () => {
  test("reads an object of arrays, nulls in optional columns", () => {
    const log = read(
      '{"time_ms":[0,100],"current_a":[0,250],"voltage_v":[0,27],"gas_l_min":[null,17],"note":"ü"}',
    );
    expect([...log.times_s]).toEqual([0, 0.1]);
    expect([...(log.readings.gas_l_min ?? [])]).toEqual([Number.NaN, 17]);
  });

  test.each([
    ['{"time_s":[0,1],"current_a":[0,"x"],"voltage_v":[0,1]}', "file-value-invalid"],
    ['{"time_s":[0,1],"current_a":[0,null],"voltage_v":[0,1]}', "file-value-invalid"],
    ['{"time_s":[0,1],"current_a":5,"voltage_v":[0,1]}', "file-value-invalid"],
    ['{"time_s":[0,1],"current_a":[0],"voltage_v":[0,1]}', "file-truncated"],
    ['{"time_s":[0,1],"current_a":[0', "file-truncated"],
    ['{"time_s":[0,1],"current_a":[0,1]}', "file-column-missing"],
    ['{"time_s":[0,1,0.5],"current_a":[0,1,1],"voltage_v":[0,1,1]}', "log-clock-reset"],
    ['{"time_s":[],"current_a":[],"voltage_v":[]}', "file-empty"],
    ["[1,2,3]", "file-format-unknown"],
    ["{oops}", "file-format-unknown"],
    ["{}", "file-header-invalid"],
  ])("refuses %s", (text, code) => {
    expect(faultsOf(text).map((fault) => fault.code)).toEqual([code]);
  });

  test("points at the value that is no number", () => {
    expect(faultsOf('{"time_s":[0,1],"current_a":[0,"x"],"voltage_v":[0,1]}')).toEqual([
      {
        code: "file-value-invalid",
        detail: 'Expected a number in current_a, value 2, got "x".',
        field: "current_a",
        pointer: "/current_a/1",
      },
    ]);
  });
});
