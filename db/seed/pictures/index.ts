import { demoPicture, type DemoPicture } from "./demo-picture";
import { hoistShaftPictures } from "./hoist-shaft-pictures";
import { otherPartPictures } from "./other-part-pictures";

/** All pictures of the demonstration; the hoist shaft's come first. */
export const demoPictures: readonly DemoPicture[] = [
  ...hoistShaftPictures,
  ...otherPartPictures,
].map(demoPicture);
