import { z } from "zod";

/** A length in mm. */
export const lengthMm = (description: string, example: number) =>
  z.number().meta({ description: `${description}, mm`, example });

/** An angle in degrees. */
export const angleDeg = (description: string, example: number) =>
  z.number().meta({ description: `${description}, degrees`, example });

/** A share from 0 to 1; never percent. */
export const share = (description: string, example: number) =>
  z
    .number()
    .min(0)
    .max(1)
    .meta({ description: `${description}, 0 to 1`, example });

/** An instant: RFC 3339 in UTC with milliseconds and `Z`. */
export const instant = (description: string) =>
  z.iso.datetime({ offset: false }).meta({
    description: `${description}, RFC 3339 in UTC`,
    example: "2026-11-30T09:41:07.250Z",
  });

/** A calendar date, `YYYY-MM-DD`. */
export const day = (description: string, example = "2026-11-30") =>
  z.iso.date().meta({ description, example });

/** An identifier: UUIDv7 (RFC 9562). People never see it. */
export const id = (description: string) =>
  z.uuid().meta({ description, example: "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77" });

/** One line of text, trimmed, not empty. */
export const line = (description: string, example: string, max = 120) =>
  z.string().trim().min(1).max(max).meta({ description, example });

/** Text of several lines. */
export const note = (description: string, example: string, max = 4000) =>
  z.string().trim().max(max).meta({ description, example });

/** A SHA-256 digest as 64 lower-case hex digits. */
export const digest = (description: string) =>
  z
    .string()
    .regex(/^[0-9a-f]{64}$/)
    .meta({ description, example: "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08" });

/** A version that grows with each change; the ETag of what people edit. */
export const version = z
  .int()
  .min(1)
  .meta({ description: "Version of the record; also its ETag", example: 3 });
