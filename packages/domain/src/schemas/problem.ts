import { z } from "zod";

/** One fault inside a problem document. */
export const ProblemFault = z.object({
  code: z.string().meta({ description: "Stable fault code", example: "file-value-invalid" }),
  detail: z.string().meta({ description: "What was found and what was expected" }),
  pointer: z.string().optional().meta({ description: "JSON pointer into the request body (RFC 6901)" }),
  line: z.int().optional().meta({ description: "Line of the file, from 1" }),
  byte: z.int().optional().meta({ description: "Byte offset in the file, from 0" }),
  field: z.string().optional().meta({ description: "Field or column" }),
  station_mm: z.number().optional().meta({ description: "Station along the seam, mm" }),
});

/** A refusal: problem details as RFC 9457 has them. */
export const Problem = z
  .object({
    type: z
      .string()
      .meta({ description: "Stable URI of the kind of problem", example: "/docs/api/problems#not-found" }),
    title: z.string().meta({ description: "Short title of the kind" }),
    status: z.int().meta({ description: "HTTP status", example: 404 }),
    detail: z.string().meta({ description: "What happened this time" }),
    instance: z.string().meta({ description: "Id of this request, for the server's log" }),
    errors: z.array(ProblemFault).meta({ description: "Every fault found, each with its place" }),
  })
  .meta({ id: "Problem" });
export type Problem = z.infer<typeof Problem>;
