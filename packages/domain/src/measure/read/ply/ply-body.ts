import type { PlyElement, PlyHeader } from "./ply-header.ts";

/** A PLY file whose header is read. */
export interface PlyBody {
  readonly bytes: Uint8Array;
  readonly header: PlyHeader;
  readonly vertex: PlyElement;
  /** Places of x, y and z among the properties of the vertex. */
  readonly columns: readonly number[];
  /** Millimetres in a unit of the file. */
  readonly scale: number;
}
