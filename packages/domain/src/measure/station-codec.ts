import type { z } from "zod";

/**
 * Stations kept compactly: a header in JSON that names the columns, then one float column after the other. At four
 * hundred stations that is a tenth of the JSON. Written once and read often, so it carries its own version.
 */
const VERSION = 1;

/** Decimals that survive: a tenth of a micrometre, far below any scanner. */
const DECIMALS = 1e4;

type Station = Readonly<Record<string, unknown>>;

interface Header {
  readonly version: number;
  readonly count: number;
  /** Columns of numbers, `root_mm.0` to `.2` for a vector. */
  readonly numbers: readonly string[];
  /** Fields that are no numbers, by station: `[index, field, value]`. */
  readonly others: ReadonlyArray<readonly [number, string, string | boolean]>;
}

const round = (value: number): number => Math.round(value * DECIMALS) / DECIMALS;

interface Spread {
  readonly columns: Map<string, Float32Array>;
  readonly others: Header["others"][number][];
  readonly count: number;
}

/** Adds a station's numbers to the columns and its other fields to the list. */
function spread(station: Station, index: number, into: Spread): void {
  const { columns, others, count } = into;
  const put = (name: string, value: number) => {
    let column = columns.get(name);
    if (!column) {
      column = new Float32Array(count).fill(Number.NaN);
      columns.set(name, column);
    }
    column[index] = value;
  };
  const putVector = (name: string, values: readonly unknown[]) => {
    for (const [place, value] of values.entries())
      if (typeof value === "number") put(`${name}.${place}`, value);
  };
  for (const [name, value] of Object.entries(station)) {
    if (typeof value === "number") put(name, value);
    else if (typeof value === "string" || typeof value === "boolean") others.push([index, name, value]);
    else if (Array.isArray(value)) putVector(name, value);
  }
}

/**
 * Stations as bytes. Numbers keep four decimals.
 * @param stations flat objects of numbers, words, flags and vectors
 */
export function encodeStations(stations: readonly Station[]): Uint8Array {
  const columns = new Map<string, Float32Array>();
  const others: Header["others"][number][] = [];
  for (const [index, station] of stations.entries())
    spread(station, index, { columns, others, count: stations.length });
  const header: Header = { version: VERSION, count: stations.length, numbers: [...columns.keys()], others };
  const text = encodeUtf8(JSON.stringify(header));
  const bytes = new Uint8Array(4 + text.length + columns.size * stations.length * 4);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, text.length, true);
  bytes.set(text, 4);
  let offset = 4 + text.length;
  for (const column of columns.values()) {
    for (const value of column) {
      view.setFloat32(offset, value, true);
      offset += 4;
    }
  }
  return bytes;
}

function put(station: Record<string, unknown>, name: string, value: number): void {
  const [field = name, place] = name.split(".");
  if (place === undefined) {
    station[field] = round(value);
    return;
  }
  const vector = Array.isArray(station[field]) ? station[field] : [];
  vector[Number(place)] = round(value);
  station[field] = vector;
}

/**
 * The stations that {@link encodeStations} wrote.
 * @param schema what each must fit
 * @throws RangeError when the bytes are of another version or cut
 */
export function decodeStations<T>(bytes: Uint8Array, schema: z.ZodType<T>): T[] {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const length = view.getUint32(0, true);
  const header: Header = JSON.parse(decodeUtf8(bytes.subarray(4, 4 + length)));
  if (header.version !== VERSION)
    throw new RangeError(`stations: expected version ${VERSION}, got ${header.version}`);
  const stations: Record<string, unknown>[] = Array.from({ length: header.count }, () => ({}));
  let offset = 4 + length;
  for (const name of header.numbers) {
    for (const station of stations) {
      const value = view.getFloat32(offset, true);
      if (!Number.isNaN(value)) put(station, name, value);
      offset += 4;
    }
  }
  for (const [index, field, value] of header.others) {
    const station = stations[index];
    if (station) station[field] = value;
  }
  return stations.map((station) => schema.parse(station));
}

/** The header is ASCII but for what a sentence may hold, so it is written escaped and stays one byte a character. */
function encodeUtf8(text: string): Uint8Array {
  const ascii = text.replaceAll(
    /[^\x20-\x7e]/g,
    (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, "0")}`,
  );
  return Uint8Array.from(ascii, (c) => c.charCodeAt(0));
}

function decodeUtf8(bytes: Uint8Array): string {
  let text = "";
  for (const byte of bytes) text += String.fromCharCode(byte);
  return text;
}
