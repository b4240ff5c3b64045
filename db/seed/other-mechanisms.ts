import type { StoryCase } from "./case-list";
import type { StoryMechanism } from "./reach";

const BY_NUMBER: Record<number, readonly StoryMechanism[]> = {
  112: [
    {
      code: "HC",
      detail: "under the head",
      verdict: "stands",
      reason: "Beach marks from one origin at the head radius; small final fracture.",
    },
    {
      code: "DO",
      detail: "on tightening",
      verdict: "ruled_out",
      reason: "No stretching at the origin; dimples in the final zone only.",
    },
  ],
  127: [
    {
      code: "HC",
      detail: "at the tooth root",
      verdict: "stands",
      reason: "Beach marks from the root fillet of both teeth, loaded side.",
    },
    {
      code: "RC",
      detail: "on the flank",
      verdict: "weighed_out",
      reason: "Pits on the flank are shallow and do not meet the fracture.",
    },
    {
      code: "GK",
      detail: "from finish grinding",
      verdict: "ruled_out",
      reason: "No rehardened layer and no shallow cracks after etching the roots.",
    },
  ],
  129: [
    {
      code: "CE",
      detail: "at the inlet edge",
      verdict: "stands",
      reason: "Cratered, no corrosion product, on the low-pressure side only.",
    },
    {
      code: "CO",
      detail: "in sea water",
      verdict: "weighed_out",
      reason: "Walls elsewhere keep their thickness; no product in the craters.",
    },
  ],
  131: [
    { code: "HC", detail: "in torsion, from the inner side", verdict: "open", reason: "" },
    {
      code: "CF",
      detail: "from a pit under the paint",
      verdict: "weighed_out",
      reason: "The paint is whole over the origin and no pit lies under it.",
    },
  ],
  134: [
    {
      code: "HC",
      detail: "in bending, from the grease hole",
      verdict: "stands",
      reason:
        "Beach marks run from the sharp edge of the cross hole over two thirds of the section.",
    },
    {
      code: "DO",
      detail: "in one event",
      verdict: "ruled_out",
      reason: "Progressive marks cover most of the face; dimples only in the last part.",
    },
    {
      code: "FF",
      detail: "in the boom lug",
      verdict: "weighed_out",
      reason: "Fretting scars lie 12 mm from the origin.",
    },
  ],
  139: [
    { code: "IH", detail: "from pickling before coating", verdict: "open", reason: "" },
    { code: "EH", detail: "in service", verdict: "open", reason: "" },
    {
      code: "HC",
      detail: "under the head",
      verdict: "weighed_out",
      reason: "No progressive marks; it broke nine days after tightening without load changes.",
    },
  ],
};

/** Mechanisms of the cases beside the hoist shaft. */
export function otherMechanisms(story: StoryCase): readonly StoryMechanism[] {
  return BY_NUMBER[story.number] ?? [];
}
