const BYTES_PER_POINT = 12;

/**
 * A cloud as binary little-endian PLY with float x, y, z.
 * @param xyz_mm points one after another, length 3 n or more
 * @param count  n
 */
export function cloudPly(xyz_mm: Float32Array, count: number): Uint8Array {
  const header = new TextEncoder().encode(
    [
      "ply",
      "format binary_little_endian 1.0",
      "comment part frame, millimetres",
      `element vertex ${count}`,
      "property float x",
      "property float y",
      "property float z",
      "end_header",
      "",
    ].join("\n"),
  );
  const file = new Uint8Array(header.length + count * BYTES_PER_POINT);
  file.set(header);
  const view = new DataView(file.buffer, header.length);
  for (let i = 0; i < 3 * count; i++) view.setFloat32(4 * i, xyz_mm[i] ?? 0, true);
  return file;
}
