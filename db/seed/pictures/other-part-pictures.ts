import { cleavage, cleavagePixelUm } from "./cleavage";
import { CAMERA, face, MICROGRAPH, plain, scaled, SEM, type Entry } from "./demo-picture";
import { fretting, frettingPixelMm } from "./fretting";
import { intergranular, intergranularPixelUm } from "./intergranular";
import { pitting, pittingPixelMm } from "./pitting";
import { boomPinFracture, brakeBoltFracture, springFracture } from "./round-part-faces";
import { weldPixelUm, weldToeCrack } from "./weld-toe-crack";

/** One picture or so of each of the other parts. */
export const otherPartPictures: Entry[] = [
  {
    fileName: "sem_bolt_b3_facets_01.png",
    technique: "sem_se",
    caption: "Bolt 3, intergranular facets at the origin",
    size: SEM,
    pixelSizeUm: intergranularPixelUm,
    resolutionInFile: false,
    draw: (size) => scaled(intergranular(size, 301)),
  },
  {
    fileName: "sem_socket_neck_01.tif",
    technique: "sem_se",
    caption: "Socket neck, cleavage facets with river lines",
    size: SEM,
    pixelSizeUm: cleavagePixelUm,
    resolutionInFile: true,
    draw: (size) => scaled(cleavage(size, 302)),
  },
  {
    fileName: "pinion_flank_01.jpg",
    technique: "stereo",
    caption: "Pits along the pitch line, loaded flank",
    size: MICROGRAPH,
    pixelSizeUm: pittingPixelMm * 1000,
    resolutionInFile: true,
    draw: (size) => plain(pitting(size, 303)),
  },
  {
    fileName: "impeller_seat_01.jpg",
    technique: "camera",
    caption: "Impeller seat, fretting scar with red-brown oxide",
    size: MICROGRAPH,
    pixelSizeUm: frettingPixelMm * 1000,
    resolutionInFile: true,
    draw: (size) => plain(fretting(size, 304)),
  },
  {
    fileName: "bracket_weld_macro_01.tif",
    technique: "light_microscope",
    caption: "Fillet weld, crack from the toe, nital etch",
    size: MICROGRAPH,
    pixelSizeUm: weldPixelUm,
    resolutionInFile: true,
    draw: (size) => {
      const picture = weldToeCrack(size, 305);
      return { picture, truth: { weld: picture.truth } };
    },
  },
  {
    fileName: "spring_coil1_face_01.jpg",
    technique: "stereo",
    caption: "Fracture face, first active coil",
    size: MICROGRAPH,
    pixelSizeUm: 11,
    resolutionInFile: true,
    draw: (size) => face(springFracture(size, 306)),
  },
  {
    fileName: "boom_pin_face_01.jpg",
    technique: "camera",
    caption: "Fracture face at the grease hole",
    size: CAMERA,
    pixelSizeUm: 39.855,
    resolutionInFile: false,
    draw: (size) => face(boomPinFracture(size, 307)),
  },
  {
    fileName: "brake_bolt_face_01.jpg",
    technique: "stereo",
    caption: "Fracture face, first engaged thread",
    size: MICROGRAPH,
    pixelSizeUm: 10.633,
    resolutionInFile: true,
    draw: (size) => face(brakeBoltFracture(size, 308)),
  },
];
