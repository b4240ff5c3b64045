import { z } from "zod";

export const VIEWS_MAX = 20;

export const SaveViewInput = z.object({
  /** Given to change a view that is kept already. */
  id: z.string().max(40).optional(),
  name: z.string().trim().min(1, "Give the view a name.").max(60, "Use at most 60 characters."),
  query: z.string().max(2000),
});
export const DropViewInput = z.object({ id: z.string().max(40) });
