import { z } from "zod";
import { isTableId } from "@/lib/hardness/published-tables";

export const SwitchTableInput = z.object({
  tableId: z.string().refine(isTableId, "There is no such table."),
  isOn: z.boolean(),
});

const convertValue = z.union(
  [
    z.number(),
    z.object({ value: z.number(), status: z.enum(["measured", "converted"]).default("measured") }),
  ],
  "Each value is a number, or a number with its status.",
);

/** Body of a conversion request. Its names are checked afterwards, against the tables. */
export const ConvertRequestBody = z.object({
  materialGroup: z.string().max(100),
  from: z.string().max(40),
  values: z.array(convertValue).min(1, "Send at least one value."),
  to: z.array(z.string().max(40)).min(1, "Name at least one scale.").max(40),
  table: z.string().max(100).optional(),
});
