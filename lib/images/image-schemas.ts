import { z } from "zod";
import { TECHNIQUES } from "./constants";

const line = (max: number) => z.string().trim().max(max, `Use at most ${max} characters.`);

/** What people say of a picture. Its pixels and what the file says stand beside the record. */
export const imageContent = z.object({
  caption: line(300),
  technique: z.enum(TECHNIQUES, { error: "Choose how the picture was taken." }),
  /** Record id of the item it shows; null when it shows none or several. */
  itemId: z.string().max(40).nullable(),
  /** Which side or face of the item: "fracture face, drive end". */
  face: line(120),
  /** Magnification as recorded at the instrument; it says nothing about scale. */
  magnification: z
    .number({ error: "Magnification needs one number." })
    .positive("Magnification is above zero.")
    .max(1e7, "Magnification is at most 10 000 000.")
    .nullable(),
  /** YYYY-MM-DD, from the file where it says so. */
  takenOn: z.iso.date({ error: "This needs a date." }).nullable(),
});
export type ImageContent = z.infer<typeof imageContent>;

export const DescribeImageInput = z.object({
  imageId: z.string().max(40),
  seenVersion: z.number().int().min(1),
  content: imageContent,
  isShareable: z.boolean(),
});

export const WithdrawImageInput = z.object({
  imageId: z.string().max(40),
  reason: line(500).min(1, "Say why it is withdrawn."),
});

export const PutBackImageInput = z.object({ imageId: z.string().max(40) });
