import { z } from "zod";

/** What a schema says of one field. */
export interface FieldRule {
  readonly required: boolean;
  readonly nullable: boolean;
  /** "string", "number", "integer", "boolean", …; undefined where the schema leaves it open. */
  readonly type: string | undefined;
  readonly minimum: number | undefined;
  readonly maximum: number | undefined;
  /** The number must be above this, not equal to it. */
  readonly above: number | undefined;
  readonly below: number | undefined;
  readonly maxLength: number | undefined;
  readonly options: readonly string[] | undefined;
  readonly description: string | undefined;
}

type JsonNode = Readonly<Record<string, unknown>>;

/** A schema in a form that fields can be looked up in. */
export interface SchemaRules {
  readonly root: JsonNode;
}

/** Reads a zod schema once; `ruleAt` then answers for each field. */
export function schemaRules(schema: z.ZodType): SchemaRules {
  return { root: z.toJSONSchema(schema, { io: "input", unrepresentable: "any" }) };
}

/**
 * The rule of a field by its path, steps divided by points: "thickness_mm", "chemistry.C", "pieces.0.position".
 * A path that the schema does not know is optional and free.
 */
export function ruleAt(rules: SchemaRules, path: string): FieldRule {
  let node = rules.root;
  let required = true;
  for (const step of path.split(".")) {
    const holder = plainNode(resolve(rules.root, node));
    const properties = nodeOf(holder["properties"]);
    const next = properties[step] ?? holder["items"] ?? holder["additionalProperties"];
    const listed = holder["required"];
    required = Array.isArray(listed) ? listed.includes(step) : /^\d+$/.test(step);
    node = nodeOf(next);
  }
  const resolved = resolve(rules.root, node);
  return ruleOf(plainNode(resolved), required, isNullable(resolved));
}

function ruleOf(node: JsonNode, required: boolean, nullable: boolean): FieldRule {
  const options = node["enum"];
  return {
    required,
    nullable,
    type: typeOf(node["type"]),
    minimum: boundOf(node["minimum"]),
    maximum: boundOf(node["maximum"]),
    above: boundOf(node["exclusiveMinimum"]),
    below: boundOf(node["exclusiveMaximum"]),
    maxLength: boundOf(node["maxLength"]),
    options: Array.isArray(options) ? options.filter((option) => typeof option === "string") : undefined,
    description: textOf(node["description"]),
  };
}

/** Follows `$ref` into the schema's own definitions. */
function resolve(root: JsonNode, node: JsonNode): JsonNode {
  const ref = textOf(node["$ref"]);
  if (ref === undefined) return node;
  const name = ref.split("/").at(-1) ?? "";
  const target = nodeOf(nodeOf(root["$defs"])[name]);
  return resolve(root, { ...target, ...withoutRef(node) });
}

function withoutRef(node: JsonNode): JsonNode {
  const { $ref: _, ...rest } = node;
  return rest;
}

/** Of "this or null", this. */
function plainNode(node: JsonNode): JsonNode {
  const choices = node["anyOf"];
  if (!Array.isArray(choices)) return node;
  const plain = choices.map(nodeOf).find((choice) => choice["type"] !== "null");
  return { ...plain, ...node };
}

function isNullable(node: JsonNode): boolean {
  const types = node["type"];
  if (Array.isArray(types)) return types.includes("null");
  const choices = node["anyOf"];
  return Array.isArray(choices) && choices.some((choice) => nodeOf(choice)["type"] === "null");
}

function nodeOf(value: unknown): JsonNode {
  return typeof value === "object" && value !== null && !Array.isArray(value) ? { ...value } : {};
}

/** A type, or of "a type or null" the type. */
function typeOf(value: unknown): string | undefined {
  return Array.isArray(value) ? textOf(value.find((type) => type !== "null")) : textOf(value);
}

function textOf(value: unknown): string | undefined {
  return typeof value === "string" ? value : undefined;
}

/** A bound that says something: zod states the safe integers as bounds of every whole number. */
function boundOf(value: unknown): number | undefined {
  return typeof value === "number" && Math.abs(value) < Number.MAX_SAFE_INTEGER ? value : undefined;
}
