// Hinges that are mirror images and take their place from the hinge they mirror.

import { quantity } from "../quantity/index.ts";
import { axisOf, memberNamed, metresAlong, readPlace } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import { notAnEnd, type PlacedChoice } from "./hinge-choice.ts";
import { mirrorOf } from "./mirror.ts";
import type { HingeChoice } from "./types.ts";

/** All choices with places: those without one get that of the hinge they mirror. Throws where there is no such hinge. */
export function mirroredChoices(
  frame: Structure,
  choices: readonly HingeChoice[],
  own: readonly (PlacedChoice | undefined)[],
): readonly PlacedChoice[] {
  if (own.every((place) => place !== undefined)) return own as readonly PlacedChoice[];
  const mirror = mirrorOf(frame);
  return choices.map((choice, i): PlacedChoice => {
    const place = own[i];
    if (place !== undefined) return place;
    const { member, from } = choice;
    const { start, end } = memberNamed(frame, member, "hinge");
    if (from !== start && from !== end) notAnEnd(member, from, start, end);
    const [imageMember, imageFrom] = [mirror.members.get(member)?.name, mirror.joints.get(from)];
    const twin = own.find(
      (other) => other?.choice.member === imageMember && other?.choice.from === imageFrom,
    );
    if (twin === undefined)
      throw new Error(
        `hinge in ${member} from ${from} is to be a mirror image, but no hinge with a place of its own is given ${
          imageMember === undefined
            ? `for ${member}, which has no mirror image`
            : `in ${imageMember} from ${imageFrom ?? "its other end"}`
        }; give that one, or a place here`,
      );
    return {
      choice,
      at: imagePlace(frame, twin),
      sources: twin.sources,
      how: `the mirror image of that in ${twin.choice.member} from ${twin.choice.from}`,
    };
  });
}

/** The same distance; a part of the length stays one. */
function imagePlace(frame: Structure, { at, choice }: PlacedChoice): PlacedChoice["at"] {
  const { place, from } = readPlace(at, `hinge in ${choice.member}`);
  if ("fraction" in place) return at;
  const { length } = axisOf(frame, memberNamed(frame, choice.member, "hinge"));
  return quantity(metresAlong(place, length), "length", { from });
}
