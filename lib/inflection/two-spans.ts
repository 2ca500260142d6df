// Two spans under uniform loads, outer ends free to turn: where the hinge of the longer span lies.
//   L, w, I    the longer span      s = L_s/L   t = w_s/w   i = I/I_s    of the shorter span to it, and I of it to the shorter
//   M_B = (wL²/8) (1 + t s³ i) / (1 + s i)         (three-moment equation; B. P. E. Clapeyron 1857, from memory)
//   M_B = wL²/2 α, since the hinge at α L from B leaves a simple beam of (1 - α) L beyond it
//   α   = (1 + t s³ i) / (1 + s i) / 4

import { checkRatio } from "./net-faults.ts";

export interface TwoSpans {
  /** Shorter span over longer span. */
  readonly spans: number;
  /** Uniform load of the shorter span over that of the longer one; 1 when absent, 0 when the shorter one bears none. */
  readonly loads?: number;
  /** EI of the longer span over that of the shorter one; 1 when absent. */
  readonly rigidity?: number;
}

/** Distance of the hinge in the longer span from the inner support, as a part of that span. Exact. Above 1 there is no such point
 *  (the whole longer span hogs). Throws on ratios that are not more than zero. */
export function twoSpanHinge({ spans: s, loads: t = 1, rigidity: i = 1 }: TwoSpans): number {
  checkRatio("shorter span over longer span", s);
  if (t !== 0) checkRatio("load of the shorter span over that of the longer one", t);
  checkRatio("EI of the longer span over that of the shorter one", i);
  return (1 + t * s ** 3 * i) / (1 + s * i) / 4;
}
