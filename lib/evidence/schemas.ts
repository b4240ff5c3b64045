import { z } from "zod";
import { CONDITION_WORDS, CUSTODY_ACTS, HAZARDS, ITEM_KINDS } from "./constants";

const shortText = (max: number) => z.string().trim().max(max, `Use at most ${max} characters.`);
const place = shortText(200).min(1, "Say where.");

/** Content of an item's version: what it is and how it looked. */
export const itemContent = z.object({
  name: shortText(200).min(2, "Say what it is."),
  description: shortText(2000),
  condition: z.array(z.enum(CONDITION_WORDS)),
  hazards: z.array(z.enum(HAZARDS)),
  massG: z.number().positive("A mass is above zero.").max(1e9).nullable(),
  seal: shortText(60),
});
export type ItemContent = z.infer<typeof itemContent>;

export const RegisterItemInput = z
  .object({
    caseId: z.string(),
    kind: z.enum(ITEM_KINDS),
    /** Record id of the item it was cut from; null for what came with the parcel. */
    parentId: z.string().nullable(),
    content: itemContent,
    /** First custody entry: where it came from and where it is now. */
    fromPlace: place,
    toPlace: place,
    reason: shortText(500).min(1, "Say how it came: carrier, waybill, or why it was cut."),
    at: z.iso.datetime({ offset: true, error: "This needs a date and time." }),
  })
  .refine(
    (input) =>
      input.kind === "part" ||
      input.kind === "fluid" ||
      input.kind === "debris" ||
      input.parentId !== null,
    {
      path: ["parentId"],
      error: "Choose what it was taken from.",
    },
  );

export const DescribeItemInput = z.object({
  caseId: z.string(),
  itemId: z.string(),
  seenVersion: z.number().int(),
  content: itemContent,
  reason: shortText(500).min(1, "Say why it changes."),
});

export const HAND_OVER_ACTS = CUSTODY_ACTS.filter((act) => act !== "received" && act !== "cut");

export const HandOverInput = z
  .object({
    caseId: z.string(),
    itemId: z.string(),
    act: z.enum(HAND_OVER_ACTS),
    /** Place after the entry; the place before is where the last entry ended. */
    toPlace: place,
    holderId: z.string().nullable(),
    reason: shortText(500).min(1, "Say why."),
    conditionNote: shortText(500).nullable(),
    sealBroken: shortText(60).nullable(),
    sealFitted: shortText(60).nullable(),
    at: z.iso.datetime({ offset: true, error: "This needs a date and time." }),
    correctsId: z.string().nullable(),
    /** Entries the person saw; another in the meantime is a conflict. */
    seenPosition: z.number().int().min(0),
  })
  .refine((input) => (input.act === "correction") === (input.correctsId !== null), {
    path: ["correctsId"],
    error: "A correction names the entry it corrects.",
  });
