import { describe, expect, it } from "vitest";
import { balance, determinacy, freeBodies } from "../../lib/statics/index.ts";
import { beam, type Structure, uniform } from "../../lib/structure/index.ts";

const plain = beam({ spans: ["6 m"] });
const [A, B] = plain.supports;
const [AB] = plain.members;
if (A === undefined || B === undefined || AB === undefined)
  throw new Error("a beam has two supports and a member");
const moment = { moment: false };

const rows: readonly (readonly [string, Structure, string])[] = [
  [
    "a support at an angle",
    { ...plain, supports: [A, { ...B, angle: 0.5 }] },
    "the support at B stands at an angle",
  ],
  [
    "a support on a spring",
    { ...plain, supports: [A, { ...B, springs: { rotation: 1e6 } }] },
    "the support at B rests on a spring",
  ],
  [
    "a shear release",
    { ...plain, members: [{ ...AB, releases: { start: moment, end: { ...moment, shear: true } } }] },
    "the end of member AB is released for shear",
  ],
  [
    "an axial release",
    { ...plain, members: [{ ...AB, releases: { start: { ...moment, axial: true }, end: moment } }] },
    "the start of member AB is released for axial force",
  ],
];

describe("what the free bodies do not know is refused", () => {
  it.each(rows)("%s", (_, structure, words) => {
    expect(() => determinacy(structure)).toThrow(words);
    expect(() => balance(structure, [uniform("AB", "1 kN/m")])).toThrow(words);
    expect(() => freeBodies(structure, [uniform("AB", "1 kN/m")])).toThrow(words);
  });
});
