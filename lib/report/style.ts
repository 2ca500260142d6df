// The look of the package: an engineer's calculation paper, line numbers left of a ruled margin, references at the
// right, one accent colour, everything else ink.

import type { CalculationRecord } from "../sheet/index.ts";
import { statusWords } from "./cautions.ts";
import { ISSUE_RULES } from "./issue-rules.ts";
import { RULES } from "./rules.ts";

/** A text as a CSS string, for the running heads; nothing in it can end the string or the style element. */
export function cssString(text: string): string {
  const safe = text.replace(/[^A-Za-z0-9 .,;:()/+-]/gu, (c) => {
    const code = c.codePointAt(0) ?? 0xfffd;
    return `\\${(code === 0 || (code >= 0xd800 && code <= 0xdfff) ? 0xfffd : code).toString(16)} `;
  });
  return `"${safe}"`;
}

function runningHeads({ head, complete }: CalculationRecord): string {
  const revision = head.revision === undefined ? "no revision" : `revision ${head.revision}`;
  const status = complete ? statusWords(head.status) : "INCOMPLETE, NOT A RESULT";
  return `
@page {
  margin: 24mm 15mm 20mm 15mm;
  @top-left { content: ${cssString(`Job ${head.job}`)}; font: 600 8.5pt sans-serif; color: #1c1b19; vertical-align: bottom; padding-bottom: 4mm; }
  @top-center { content: ${cssString(head.title)}; font: 8.5pt sans-serif; color: #1c1b19; vertical-align: bottom; padding-bottom: 4mm; }
  @top-right { content: ${cssString(revision)}; font: 8.5pt sans-serif; color: #1c1b19; vertical-align: bottom; padding-bottom: 4mm; }
  @bottom-left { content: ${cssString(status)}; font: 600 8.5pt sans-serif; color: #1c1b19; vertical-align: top; padding-top: 4mm; }
  @bottom-right { content: "page " counter(page) " of " counter(pages); font: 8.5pt sans-serif; color: #1c1b19; vertical-align: top; padding-top: 4mm; }
}
`;
}

/** The whole style of a package. */
export const pageStyle = (record: CalculationRecord): string => RULES + ISSUE_RULES + runningHeads(record);
