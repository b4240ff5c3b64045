"use server";

import { action } from "@/lib/http/action";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { CalibrateImageInput } from "@/lib/images/calibration-schemas";
import { changeMark } from "@/lib/images/change-mark";
import { deleteMark } from "@/lib/images/delete-mark";
import {
  ChangeMarkInput,
  DeleteMarkInput,
  PlaceMarkInput,
  RestoreMarkInput,
} from "@/lib/images/mark-schemas";
import { placeMark } from "@/lib/images/place-mark";
import { restoreMark } from "@/lib/images/restore-mark";

export const place = action({ permission: "image.mark", input: PlaceMarkInput }, (actor, input) =>
  placeMark(actor, input),
);

export const change = action({ permission: "image.mark", input: ChangeMarkInput }, (actor, input) =>
  changeMark(actor, input),
);

export const remove = action({ permission: "image.mark", input: DeleteMarkInput }, (actor, input) =>
  deleteMark(actor, input),
);

export const restore = action(
  { permission: "image.mark", input: RestoreMarkInput },
  (actor, input) => restoreMark(actor, input),
);

export const setScale = action(
  { permission: "image.calibrate", input: CalibrateImageInput },
  (actor, input) => calibrateImage(actor, input),
);
