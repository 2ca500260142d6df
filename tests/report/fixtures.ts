// The record of an invented store roof frame, by hand: the portal of tests/drawing/fixtures.ts with its values.

import type { CalculationRecord, Entry, FormulaLines, ShownValue } from "../../lib/sheet/index.ts";
import { kneeFigure, portalDiagrams, portalFigure, sway } from "../drawing/fixtures.ts";

const shown = (si: number, dimension: string, unit: string, text: string): ShownValue => ({
  si,
  dimension,
  unit,
  text,
});
const metres = (si: number, text: string): ShownValue => shown(si, "length", "m", text);
const kN = (si: number, text: string): ShownValue => shown(si, "force", "kN", text);
const perMetre = (si: number, text: string): ShownValue => shown(si, "force per length", "kN/m", text);
const kNm = (si: number, text: string): ShownValue => shown(si, "moment", "kN m", text);

const lines = (left: string, symbols: string, numbers: string, result: string): FormulaLines => ({
  symbols: `${left} = ${symbols}`,
  numbers: `${left} = ${numbers}`,
  result: `${left} = ${result}`,
});

const base = (id: string, cell: number, uses: readonly string[] = []) => ({
  id,
  version: 1,
  cell,
  uses,
  outOfDate: false,
});

const closure = (id: string, sum: string, terms: string, left: string, passed: boolean): Entry => ({
  ...base(id, 6, ["A_x@1", "A_y@1", "h1_y@1"]),
  kind: "check",
  formula: `${id} = 0`,
  lines: { symbols: `${sum} = ${terms}`, numbers: "24.9 - 24.9", result: `${sum} = ${left}` },
  inputs: {},
  passed,
  closure: true,
  description: `roof: ${id === "closure 1" ? "column AB" : "joint B"}: the equation left over closes by itself`,
});

const entries: readonly Entry[] = [
  {
    ...base("text 1", 1),
    kind: "text",
    markdown:
      "# Store roof frame, line 6\n\nThe frame carries the **roof** and the wind at the eave. Hinges are put where the moment is expected to be zero; with $L$ the span, that is about $0.125 L$ from each knee.",
  },
  { ...base("text 2", 2), kind: "text", markdown: "## Given" },
  {
    ...base("L", 2),
    kind: "given",
    symbol: "L",
    tex: "L",
    value: metres(14, "14.0 m"),
    description: "span between column centrelines",
    source: "drawing S-102 rev B",
  },
  {
    ...base("h", 2),
    kind: "given",
    symbol: "h",
    tex: "h",
    value: metres(5.5, "5.50 m"),
    description: "base to beam centreline",
    source: "drawing S-102 rev B",
  },
  {
    ...base("g", 2),
    version: 2,
    kind: "given",
    symbol: "g",
    tex: "g",
    value: perMetre(6000, "6.00 kN/m"),
    description: "roof, permanent",
    overridden: perMetre(5200, "5.20 kN/m"),
  },
  {
    ...base("s", 2),
    kind: "given",
    symbol: "s",
    tex: "s",
    value: perMetre(6800, "6.80 kN/m"),
    description: "snow",
    source: "site note 4",
  },
  {
    ...base("W_pl", 2),
    kind: "given",
    symbol: "W_pl",
    tex: "W_{pl}",
    value: shown(1.19e-3, "section modulus", "cm^3", "1190 cm³"),
    description: "plastic modulus of the beam first tried",
    source: "section list of the office",
  },
  {
    ...base("f_y", 2),
    kind: "given",
    symbol: "f_y",
    tex: "f_y",
    value: shown(275e6, "force per area", "MPa", "275 MPa"),
    description: "yield strength",
    source: "specification, clause 3",
  },
  {
    ...base("hinge h1", 3, ["L@1"]),
    kind: "assumption",
    symbol: "a",
    tex: "a",
    value: metres(1.75, "1.75 m"),
    text: "Hinges in the beam at 0.125 L from each knee.",
    because: "beam about twice as stiff as the columns",
  },
  {
    ...base("bases", 3),
    kind: "assumption",
    text: "Bases are pinned.",
    because: "base plates with two bolts on the centreline",
  },
  {
    ...base("r_I", 3),
    kind: "assumption",
    symbol: "r_I",
    tex: "r_I",
    value: shown(2.5, "pure number", "", "2.50"),
    text: "r_I = 2.50",
    because: "first guess of sizes",
    overridden: shown(2, "pure number", "", "2.00"),
  },
  { ...base("text 3", 4), kind: "text", markdown: "## Loads and bodies" },
  {
    ...base("w", 4, ["g@2", "s@1"]),
    kind: "calc",
    symbol: "w",
    tex: "w",
    formula: "w = g + s",
    lines: lines("w", "g + s", "6.00\\,\\mathrm{kN/m} + 6.80\\,\\mathrm{kN/m}", "12.8\\,\\mathrm{kN/m}"),
    inputs: { g: 6000, s: 6800 },
    value: perMetre(12800, "12.8 kN/m"),
    description: "roof load on the beam",
  },
  {
    ...base("frame", 5, ["L@1", "h@1", "hinge h1@1", "w@1"]),
    kind: "figure",
    caption: "Frame, loads and hinges.",
    alternative: portalFigure.description,
    spec: portalFigure,
  },
  {
    ...base("determinacy", 5, ["L@1", "h@1", "bases@1"]),
    kind: "finding",
    title: "Determinacy",
    verdict:
      "Indeterminate to the first degree before hinges; with two hinges a mechanism that balances this load only.",
    lines: [
      "r = 4, m = 3, j = 4, c = 0",
      "3m + r − 3j − c = 9 + 4 − 12 − 0 = 1",
      "rank of the equilibrium matrix 12 of 13 unknowns",
    ],
  },
  {
    ...base("mechanism", 5, ["determinacy@1", "hinge h1@1"]),
    kind: "figure",
    caption: "What the hinged frame would do under any other load.",
    alternative: sway.description,
    spec: sway,
  },
  {
    ...base("h1_y", 6, ["w@1", "L@1", "hinge h1@1"]),
    kind: "step",
    body: "beam between h1 and h2",
    lines: lines(
      "Y_{h1}",
      "\\frac{w (L - 2 a)}{2}",
      "\\frac{12.8\\,\\mathrm{kN/m} \\cdot (14.0\\,\\mathrm{m} - 2 \\cdot 1.75\\,\\mathrm{m})}{2}",
      "67.2\\,\\mathrm{kN}",
    ),
    value: kN(67200, "67.2 kN"),
    terms: [{ coefficient: -5.25, value: 134400 }],
    coefficient: 10.5,
  },
  {
    ...base("knee body", 6, ["w@1", "hinge h1@1", "h1_y@1"]),
    kind: "figure",
    caption: "Column AB with beam to h1.",
    alternative: kneeFigure.description,
    spec: kneeFigure,
  },
  {
    ...base("A_y", 6, ["w@1", "h1_y@1", "hinge h1@1"]),
    kind: "step",
    body: "column AB with beam to h1",
    lines: {
      symbols: "\\sum F_y = 0:\\; A_y - w a - Y_{h1} = 0",
      numbers: "A_y - 22.4\\,\\mathrm{kN} - 67.2\\,\\mathrm{kN} = 0",
      result: "A_y = 89.6\\,\\mathrm{kN}",
    },
    value: kN(89600, "89.6 kN"),
    terms: [
      { coefficient: -1, value: 22400 },
      { coefficient: -1, value: 67200 },
    ],
    coefficient: 1,
  },
  {
    ...base("A_x", 6, ["w@1", "h1_y@1", "A_y@1", "h@1", "hinge h1@1"]),
    kind: "step",
    body: "column AB with beam to h1",
    lines: {
      symbols: "\\sum M_{h1} = 0:\\; A_x h - A_y a + w a \\frac{a}{2} = 0",
      numbers:
        "A_x \\cdot 5.50\\,\\mathrm{m} - 89.6\\,\\mathrm{kN} \\cdot 1.75\\,\\mathrm{m} + 22.4\\,\\mathrm{kN} \\cdot 0.875\\,\\mathrm{m} = 0",
      result: "A_x = 24.9\\,\\mathrm{kN}",
    },
    value: kN(24945.45, "24.9 kN"),
    terms: [
      { coefficient: -1.75, value: 89600 },
      { coefficient: 0.875, value: 22400 },
    ],
    coefficient: 5.5,
  },
  closure("closure 1", "\\sum F_x", "A_x - X_{h1}", "0\\,\\mathrm{kN}", true),
  closure("closure 2", "\\sum F_y", "A_y - w a - Y_{h1}", "0.1\\,\\mathrm{kN}", false),
  {
    ...base("diagrams", 7, ["A_x@1", "A_y@1", "w@1"]),
    kind: "figure",
    caption: "Axial force, shear and moment; moments on the tension side.",
    alternative: portalDiagrams.description,
    spec: portalDiagrams,
  },
  {
    ...base("M_B", 7, ["A_x@1", "h@1"]),
    kind: "result",
    symbol: "M_B",
    tex: "M_B",
    value: kNm(137200, "137 kN·m"),
    description: "knee moment, tension outside",
    governing: false,
  },
  {
    ...base("M_m", 7, ["w@1", "L@1", "hinge h1@1"]),
    kind: "result",
    symbol: "M_m",
    tex: "M_m",
    value: kNm(176400, "176 kN·m"),
    description: "greatest moment, beam at midspan",
    governing: true,
    band: {
      low: kNm(149940, "150 kN·m"),
      high: kNm(201096, "201 kN·m"),
      least: kNm(141120, "141 kN·m"),
      greatest: kNm(208152, "208 kN·m"),
      measure: "ratio",
      against: { low: 0.85, high: 1.14, least: 0.8, greatest: 1.18 },
      bias: shown(-0.02, "pure number", "", "−2 %"),
      words: "of the stiffnesses tried; loads, geometry, cracking and second order not varied",
      uses: ["bases@1"],
    },
  },
  {
    ...base("reactions", 8, []),
    kind: "table",
    caption: "Reactions under roof and snow",
    columns: ["support", "horizontal", "vertical", "remark"],
    rows: [
      [
        "A",
        {
          value: kN(24945.45, "24.9 kN"),
          uses: ["A_x@1"],
          band: {
            low: kN(20000, "20.0 kN"),
            high: kN(31000, "31.0 kN"),
            least: kN(19000, "19.0 kN"),
            greatest: kN(32000, "32.0 kN"),
            measure: "difference",
            against: { low: -4945.45, high: 6054.55, least: -5945.45, greatest: 7054.55 },
            bias: kN(500, "+0.50 kN"),
            words: "of the stiffnesses tried; loads, geometry, cracking and second order not varied",
            uses: ["bases@1"],
          },
        },
        { value: kN(89600, "89.6 kN"), uses: ["A_y@1"] },
        "inwards",
      ],
      [
        "D",
        { value: kN(-24945.45, "−24.9 kN"), uses: ["A_x@1"] },
        { value: kN(89600, "89.6 kN"), uses: ["A_y@1"] },
        "by symmetry",
      ],
    ],
  },
  {
    ...base("M_Rd", 9, ["W_pl@1", "f_y@1"]),
    kind: "calc",
    symbol: "M_Rd",
    tex: "M_{Rd}",
    formula: "M_Rd = W_pl*f_y",
    lines: lines(
      "M_{Rd}",
      "W_{pl} f_y",
      "1190\\,\\mathrm{cm}^3 \\cdot 275\\,\\mathrm{MPa}",
      "327\\,\\mathrm{kN}{\\cdot}\\mathrm{m}",
    ),
    inputs: { W_pl: 1.19e-3, f_y: 275e6 },
    value: kNm(327250, "327 kN·m"),
    description: "moment resistance of the beam, no lateral buckling",
  },
  {
    ...base("check 1", 9, ["M_m@1", "M_Rd@1"]),
    kind: "check",
    formula: "M_m <= M_Rd",
    lines: {
      symbols: "M_m \\le M_{Rd}",
      numbers: "176\\,\\mathrm{kN}{\\cdot}\\mathrm{m} \\le 327\\,\\mathrm{kN}{\\cdot}\\mathrm{m}",
      result: "176\\,\\mathrm{kN}{\\cdot}\\mathrm{m} \\le 327\\,\\mathrm{kN}{\\cdot}\\mathrm{m}",
    },
    inputs: { M_m: 176400, M_Rd: 327250 },
    passed: true,
    utilisation: 0.539,
    description: "beam in bending",
  },
  {
    ...base("check 2", 9, ["h@1", "L@1"]),
    kind: "check",
    formula: "h <= L/3",
    lines: {
      symbols: "h \\le \\frac{L}{3}",
      numbers: "5.50\\,\\mathrm{m} \\le \\frac{14.0\\,\\mathrm{m}}{3}",
      result: "5.50\\,\\mathrm{m} > 4.67\\,\\mathrm{m}",
    },
    inputs: { h: 5.5, L: 14 },
    passed: false,
    utilisation: 1.179,
    description: "proportions the office keeps to",
  },
  {
    ...base("query 1", 9, ["hinge h1@1"]),
    kind: "query",
    text: "The left hinge lies within the range of the isolated span, but the columns are slender: has base fixity been considered?",
  },
  { ...base("note 1", 9, ["M_m@1"]), kind: "note", text: "Wind is taken in a separate sheet." },
  {
    ...base("conclusion", 10, ["M_m@1", "check 1@1"]),
    kind: "conclusion",
    text: "The beam at midspan governs.",
  },
];

export const record: CalculationRecord = {
  format: "hingebook record",
  version: 0,
  complete: true,
  head: {
    title: "Store roof frame, line 6",
    job: "2031",
    preparedBy: "RT",
    date: "2026-03-02",
    revision: "A",
    basis: "EN 1990:2002, recommended values",
    units: "kN, m",
    status: "preliminary",
  },
  overrides: [{ symbol: "g", written: "5.2 kN/m", set: "6 kN/m" }],
  entries,
  notebook: {
    name: "store-roof.ipynb",
    source: '{"cells":[{"cell_type":"code","source":["const L = 1 < 2"]}]}',
  },
  versions: { hingebook: "0.1.0", node: "20.20.2" },
};

export const incomplete: CalculationRecord = {
  ...record,
  complete: false,
  failure: {
    cell: 6,
    line: 3,
    message: 'member "BC" ends at joint "E", which is not defined; joints are A, B, C, D',
    excerpt:
      '  2 | const bodies =\n> 3 |   sheet.freeBodies(gravity, "E");\n    |                             ^',
  },
  entries: entries.slice(0, 17),
};

/** The record with one thing changed upstream: what stands on it is out of date. */
export const outdated: CalculationRecord = {
  ...record,
  entries: entries.map((e) =>
    e.id === "L" ? { ...e, version: 2 } : e.uses.includes("L@1") ? { ...e, outOfDate: true } : e,
  ),
};
