// A model written as JSON and read back; what is read is checked as coming from a stranger.

import { quantity } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { checkLoads } from "./check-loads.ts";
import { StructureError } from "./faults.ts";
import { deepFreeze } from "./freeze.ts";
import { byName } from "./geometry.ts";
import { withHinges } from "./hinges.ts";
import { modelSchema } from "./model-schema.ts";
import { checkSchema } from "./schema-check.ts";
import { kindOf } from "./support.ts";
import type { Hinge, Imposed, Joint, Load, Member, Structure, Support } from "./types.ts";

/** A structure and what acts on it. */
export interface Model {
  readonly structure: Structure;
  readonly loads: readonly (Load | Imposed)[];
}

/** The model as JSON text in the published form (model.schema.json), SI; read back it is the same. */
export function structureToJson(structure: Structure, loads: readonly (Load | Imposed)[] = []): string {
  const { family, form, joints, members, supports, hinges } = structure;
  const head = { format: "hingebook model", version: 1, family, ...(form === undefined ? {} : { form }) };
  return `${JSON.stringify({ ...head, joints, members, supports, hinges, loads }, null, 2)}\n`;
}

/** The model in a JSON text, or in a value parsed from one. Throws where the form is not the published one, naming the
 *  place ("model.members[3].section.E"), and on everything a structure or its loads are refused for. */
export function structureFromJson(json: unknown): Model {
  const value = typeof json === "string" ? parsed(json) : json;
  checkSchema(modelSchema, value, "model");
  const written = value as Written;
  const plain = assemble({
    family: written.family ?? "general",
    ...(written.form === undefined ? {} : { form: written.form }),
    joints: written.joints.map((j) => ({ ...j, from: j.from ?? [] })),
    members: written.members.map(memberOf),
    supports: written.supports.map(supportOf),
    hinges: [],
  });
  const structure = hinged(plain, written.hinges ?? []);
  const loads = (written.loads ?? []).map((load) =>
    deepFreeze({ ...load, label: load.label ?? "", from: load.from ?? [] }),
  ) as (Load | Imposed)[];
  checkLoads(structure, loads);
  return deepFreeze({ structure, loads });
}

type Open<T, K extends keyof T> = Omit<T, K> & Partial<Pick<T, K>>;

interface Written {
  readonly family?: Structure["family"];
  readonly form?: NonNullable<Structure["form"]>;
  readonly joints: readonly Open<Joint, "from">[];
  readonly members: readonly (Omit<Open<Member, "from">, "releases"> & {
    readonly releases?: Partial<Member["releases"]>;
  })[];
  readonly supports: readonly (Omit<Open<Support, "from" | "kind">, "holds"> & {
    readonly holds: Partial<Support["holds"]>;
  })[];
  readonly hinges?: readonly Open<Hinge, "from">[];
  readonly loads?: readonly { readonly label?: string; readonly from?: readonly string[] }[];
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    throw new StructureError({
      kind: "not a model",
      where: "model",
      found: `no JSON (${(error as Error).message})`,
      wanted: "a model written by structureToJson",
    });
  }
}

function memberOf({ releases = {}, from = [], ...rest }: Written["members"][number]): Member {
  const { start = { moment: false }, end = { moment: false } } = releases;
  return { ...rest, releases: { start, end }, from };
}

function supportOf({ holds, kind, from = [], ...rest }: Written["supports"][number]): Support {
  const { x = false, y = false, rotation = false } = holds;
  const full = { x, y, rotation };
  return { ...rest, kind: kind ?? kindOf(full), holds: full, from };
}

function hinged(structure: Structure, hinges: NonNullable<Written["hinges"]>): Structure {
  if (hinges.length === 0) return structure;
  const members = byName(structure.members);
  const placed = withHinges(
    structure,
    hinges.map(({ name, member, at, from = [] }) => ({
      name,
      member,
      from: members.get(member)?.start ?? "",
      at: quantity(at, "length"),
      sources: from,
    })),
  );
  const all = placed.hinges.map((hinge, i): Hinge => {
    const { part, fromEnd } = hinges[i] ?? {};
    return {
      ...hinge,
      ...(part === undefined ? {} : { part }),
      ...(fromEnd === true ? { fromEnd } : {}),
    };
  });
  return deepFreeze({ ...placed, hinges: all });
}
