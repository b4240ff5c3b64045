"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { describeImage } from "@/lib/images/describe-image";
import {
  DescribeImageInput,
  PutBackImageInput,
  WithdrawImageInput,
} from "@/lib/images/image-schemas";
import { putBackImage, withdrawImage } from "@/lib/images/withdraw-image";

const PICTURES = "/cases/[caseId]/images";

export const describe = action(
  { permission: "image.describe", input: DescribeImageInput },
  async (actor, input) => {
    const { number } = await describeImage(actor, input);
    revalidatePath(PICTURES, "page");
    return { version: number };
  },
);

export const withdraw = action(
  { permission: "image.describe", input: WithdrawImageInput },
  async (actor, input) => {
    const { label } = await withdrawImage(actor, input);
    revalidatePath(PICTURES, "page");
    return { label };
  },
);

export const putBack = action(
  { permission: "image.describe", input: PutBackImageInput },
  async (actor, input) => {
    const { label } = await putBackImage(actor, input);
    revalidatePath(PICTURES, "page");
    return { label };
  },
);
