import type { Cast } from "./actors";
import type { StoryCase } from "./case-list";
import { addPicture, scaleFromFile } from "./pictures-of";
import { demoPictures } from "./pictures";

/** One picture of each of the other parts that were photographed. */
const BY_NUMBER: Record<number, string> = {
  127: "pinion_flank_01.jpg",
  131: "spring_coil1_face_01.jpg",
  134: "boom_pin_face_01.jpg",
  139: "sem_bolt_b3_facets_01.png",
  140: "sem_socket_neck_01.tif",
  141: "bracket_weld_macro_01.tif",
  143: "brake_bolt_face_01.jpg",
  144: "impeller_seat_01.jpg",
};

/** Adds the picture of a case, with its scale where the file states one. */
export async function otherPictures(
  cast: Cast,
  story: StoryCase,
  caseId: string,
  itemId: string | null,
): Promise<void> {
  const fileName = BY_NUMBER[story.number];
  if (!fileName) return;
  const added = await addPicture(cast.technician, caseId, fileName, { itemId });
  const picture = demoPictures.find((known) => known.fileName === fileName);
  if (picture?.resolutionInFile) await scaleFromFile(cast.technician, added);
}
