// The record's schema: published beside the code, and saying what the types say.
import { existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { expect, test } from "vitest";
import { recordJsonSchema } from "../../lib/sheet/schema.ts";

const published = new URL("../../lib/sheet/record.schema.json", import.meta.url);
const changed = new URL("../../lib/sheet/record-changed.schema.json", import.meta.url);

test("record.schema.json is the schema the reader uses; a new one is left beside it", () => {
  const schema = recordJsonSchema();
  const before: unknown = existsSync(published) ? JSON.parse(readFileSync(published, "utf8")) : undefined;
  if (JSON.stringify(before) !== JSON.stringify(schema))
    writeFileSync(before === undefined ? published : changed, `${JSON.stringify(schema, null, 2)}\n`);
  else rmSync(changed, { force: true });
  expect(before).toEqual(schema);
});

test("the schema is closed, bounded and names its version", () => {
  const text = readFileSync(published, "utf8");
  const schema = JSON.parse(text);
  expect(schema.$schema).toBe("https://json-schema.org/draft/2020-12/schema");
  expect(schema.properties.version).toMatchObject({ const: 0 });
  expect(schema.additionalProperties).toBe(false);
  expect(schema.required).toEqual(
    expect.arrayContaining(["format", "version", "complete", "head", "entries", "notebook", "versions"]),
  );
  expect(text.match(/"type": "array"/g)?.length).toBe(text.match(/"maxItems"/g)?.length);
});

test("the room's index does not load the validator", () => {
  const folder = new URL("../../lib/sheet/", import.meta.url);
  const reached = new Set(["index.ts"]);
  for (const file of reached)
    for (const [, next] of readFileSync(new URL(file, folder), "utf8").matchAll(/from "\.\/([^"]+)"/g))
      reached.add(next ?? "");
  expect([...reached].filter((file) => file.startsWith("schema") || file === "read-record.ts")).toEqual([]);
  const withZod = readdirSync(folder).filter(
    (file) => file.endsWith(".ts") && /from "zod"/.test(readFileSync(new URL(file, folder), "utf8")),
  );
  expect(withZod.length).toBeGreaterThan(2);
  expect(withZod.filter((file) => reached.has(file))).toEqual([]);
});
