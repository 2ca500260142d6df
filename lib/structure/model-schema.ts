// The form in which a model is exchanged, as JSON Schema (draft 2020-12); published beside this file as model.schema.json.
// SI throughout: m, N, N·m, rad, K; axes and signs as in types.ts.

/** The part of JSON Schema used here. */
export interface Schema {
  readonly $schema?: string;
  readonly title?: string;
  readonly description?: string;
  readonly type?: "object" | "array" | "string" | "number" | "boolean";
  readonly const?: string | number;
  readonly enum?: readonly string[];
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly required?: readonly string[];
  readonly additionalProperties?: false;
  readonly items?: Schema;
  readonly minItems?: number;
  readonly maxItems?: number;
  readonly exclusiveMinimum?: number;
  readonly minimum?: number;
  readonly anyOf?: readonly Schema[];
}

const text: Schema = { type: "string" };
const number: Schema = { type: "number" };
const flag: Schema = { type: "boolean" };
const positive: Schema = { type: "number", exclusiveMinimum: 0 };
const notNegative: Schema = { type: "number", minimum: 0 };
const sources: Schema = { type: "array", items: text, description: "ledger entries a value came from" };

function record(
  required: Readonly<Record<string, Schema>>,
  optional: Readonly<Record<string, Schema>> = {},
): Schema {
  return {
    type: "object",
    properties: { ...required, ...optional },
    required: Object.keys(required),
    additionalProperties: false,
  };
}

const list = (items: Schema, minItems = 0): Schema => ({ type: "array", items, minItems });

const place: Schema = {
  description: "metres from the member's start, or a fraction of its length",
  anyOf: [record({ metres: number }), record({ fraction: number })],
};
const release = record({ moment: flag }, { shear: flag, axial: flag });
const section = record({ A: positive, I: positive, E: positive }, { alpha: number, depth: positive });
const direction: Schema = { type: "array", items: number, minItems: 2, maxItems: 2 };
const words = { label: text, from: sources };
const sized = { ...words, fromSize: sources };

const loads: readonly Schema[] = [
  record(
    {
      kind: { const: "distributed" },
      member: text,
      begin: place,
      end: place,
      q1: number,
      q2: number,
      direction,
    },
    { axes: { const: "member" }, per: { enum: ["horizontal", "vertical"] }, ...sized },
  ),
  record(
    { kind: { const: "member point" }, member: text, at: place, fx: number, fy: number, couple: number },
    { axes: { const: "member" }, ...sized },
  ),
  record({ kind: { const: "joint" }, joint: text, fx: number, fy: number, couple: number }, words),
  record({ kind: { const: "temperature" }, member: text, uniform: number, difference: number }, words),
  record({ kind: { const: "settlement" }, joint: text, x: number, y: number, rotation: number }, words),
];

/** A structure with its loads. */
export const modelSchema: Schema = {
  $schema: "https://json-schema.org/draft/2020-12/schema",
  title: "Plane skeleton with loads",
  description:
    "SI units: m, N, N·m, rad, K. x to the right, y up, rotations counter-clockwise. Positions along a member are measured from its start.",
  ...record(
    {
      format: { const: "hingebook model" },
      version: { const: 1 },
      joints: list(
        record({ name: text, x: number, y: number }, { fromX: sources, fromY: sources, from: sources }),
        1,
      ),
      members: list(
        record(
          { name: text, start: text, end: text },
          { releases: record({}, { start: release, end: release }), section, group: text, from: sources },
        ),
        1,
      ),
      supports: list(
        record(
          { joint: text, holds: record({}, { x: flag, y: flag, rotation: flag }) },
          {
            kind: { enum: ["fixed", "pinned", "roller", "free"] },
            springs: record({}, { x: notNegative, y: notNegative, rotation: notNegative }),
            angle: number,
            from: sources,
          },
        ),
        1,
      ),
    },
    {
      family: { enum: ["beam", "portal", "general"] },
      form: { enum: ["building frame", "truss", "panel girder", "truss portal"] },
      hinges: list(
        record(
          { name: text, member: text, at: number },
          { part: number, fromEnd: { type: "boolean" }, from: sources },
        ),
      ),
      loads: list({ anyOf: loads }),
    },
  ),
};
