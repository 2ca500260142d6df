// What the true values of a hand are: those of the frame as given, under all loads of all sets together, for many stiffnesses.

import { type Sampled, sampled } from "../accuracy/index.ts";
import type { Structure } from "../structure/types.ts";
import { actualLoads } from "./actual-loads.ts";
import type { Hand } from "./types.ts";
import type { UnknownFrame } from "./unknown-frame.ts";

/** Frames drawn for a band, and the seed they are drawn with. */
export const samples = 500;
export const seed = 1;

/** So many frames are kept with their samples, the one used last longest. */
const kept = 12;
// By content: what was solved once is not solved again when a notebook is run again in the same process.
const cache = new Map<string, Sampled>();

/** All samples of a hand's frame, solved; asked again for the same frame, loads and unknowns they are not solved again.
 *  Throws where the frame can move freely, naming the motion. */
export function truthOf({ solved }: Hand, { structure, unknowns }: UnknownFrame): Sampled {
  const loads = actualLoads(solved.map(({ set }) => set));
  const key = JSON.stringify([bare(structure), loads, unknowns], withoutSources);
  const found = cache.get(key) ?? sampled({ structure, cases: [loads], unknowns, samples, seed });
  cache.delete(key);
  cache.set(key, found);
  for (const oldest of cache.keys()) {
    if (cache.size <= kept) break;
    cache.delete(oldest);
  }
  return found;
}

/** What the solution depends on. */
const bare = ({ joints, members, supports, hinges }: Structure): object => ({
  joints,
  members,
  supports,
  hinges,
});

const words: ReadonlySet<string> = new Set(["from", "fromX", "fromY", "fromSize", "label"]);
const withoutSources = (key: string, value: unknown): unknown => (words.has(key) ? undefined : value);
