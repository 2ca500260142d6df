// Plain texts set with care: numbers keep their units, a minus is a minus.

const UNITS =
  "kN|MN|N|kNm|kip|kips|lbf|lb|klf|plf|psf|ksf|ksi|psi|kPa|MPa|GPa|Pa|m|mm|cm|km|ft|in|yd|rad|deg|K|t|kg|%";
const BEFORE_UNIT = new RegExp(`(?<=\\d) (?=(?:${UNITS})(?![A-Za-z]))`, "g");

/** A text in which no line ends between a number and its unit. */
export const unbroken = (text: string): string => text.replace(BEFORE_UNIT, "\u00a0");

/** A text with hyphens that stand for a minus ("9 - 4 = -1") written as one. */
export const withMinus = (text: string): string => text.replace(/(?<= )-(?= )|(?<=[=(] ?)-(?=\d)/g, "−");
