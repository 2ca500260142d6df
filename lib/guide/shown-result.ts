// A hand result as a notebook shows it: its value, and beneath it the band.

import { type Dimension, displayedAs, printValue, type Quantity } from "../quantity/index.ts";
import { bandText, escaped } from "../sheet/index.ts";
import type { BandBook } from "./band-book.ts";
import { asResultOf, originOf } from "./origin.ts";

/** The same hand result, showing itself with its band, which is worked out when it is shown. */
export function withBandShown<D extends Dimension>(value: Quantity<D>, bands: BandBook): Quantity<D> {
  const known = originOf(value);
  if (known === undefined) return value;
  const copy: Quantity<D> = displayedAs(value, () => {
    const [band] = bands.of([copy]);
    const text = printValue(copy);
    if (band === undefined) return Object.freeze({ "text/plain": text });
    const words = bandText(band);
    return Object.freeze({
      "text/html": `<div>${escaped(text)}</div><div><small>${escaped(words)}; ${escaped(band.words)}</small></div>`,
      "text/plain": `${text}\n${words}; ${band.words}`,
    });
  });
  return asResultOf(copy, known.origin);
}
