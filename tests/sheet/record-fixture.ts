// A small calculation recorded by the ledger itself, with whatever is changed in it.
import { type CalculationRecord, forgetLedger, openLedger } from "../../lib/sheet/index.ts";

interface Written {
  readonly s: string;
  readonly sourceOfL: string;
  readonly reasonOfK: string;
  readonly limit: string;
  readonly more: boolean;
}

const plain: Written = {
  s: "7.6 kN/m",
  sourceOfL: "drawing S-102 rev B",
  reasonOfK: "first guess",
  limit: "400 kN m",
  more: false,
};

/** The record of an invented simple beam. */
export function notebook(change: Partial<Written> = {}): CalculationRecord {
  const { s, sourceOfL, reasonOfK, limit, more } = { ...plain, ...change };
  forgetLedger();
  try {
    const sheet = openLedger({
      title: "Canopy beam",
      job: "2031",
      preparedBy: "RT",
      basis: "EN 1990:2002, recommended values",
      units: "kN, m",
      status: "preliminary",
    });
    sheet.given("L", "14 m", "span", { from: sourceOfL });
    sheet.given("g", "5.2 kN/m", "permanent");
    sheet.given("s", s as "7.6 kN/m", "snow");
    sheet.given("M_R", limit as "400 kN m", "resistance");
    sheet.assume("k", 0.9, reasonOfK);
    sheet.calc("w = g + s", "kN/m", "load");
    sheet.calc("M_0 = w*L^2/8", "kN m", "moment at midspan");
    sheet.calc("V_0 = w*L/2", "kN", "reaction");
    sheet.calc("G_0 = g*L", "kN", "permanent load in all");
    sheet.check("M_0 <= M_R", "bending");
    if (more) {
      sheet.note("Ponding was looked at.");
      sheet.query("Is the snow drifting?");
    }
    return sheet.record({
      complete: true,
      notebook: { name: "beam.ipynb", source: "{}" },
      versions: { hingebook: "0.0.0" },
    });
  } finally {
    forgetLedger();
  }
}
