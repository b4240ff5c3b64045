import { asReceived, asReceivedPixelMm } from "./as-received";
import { caseLayer, caseLayerPixelUm } from "./case-layer";
import { CAMERA, face, MICROGRAPH, plain, scaled, SEM, type Entry } from "./demo-picture";
import { dimples, dimplesPixelUm } from "./dimples";
import { fractureFace } from "./fracture-face";
import { fractureOblique } from "./fracture-oblique";
import { fractureFinal, fractureMiddle, fractureOrigin } from "./fracture-origin";
import { grainBoundaries, grainBoundariesPixelUm } from "./grain-boundaries";
import { fineStriations, striations, striations2000, striations5000 } from "./striations";
import { temperedMartensite, temperedMartensitePixelUm } from "./tempered-martensite";
import type { Size } from "./picture";

/** Seed of everything cut from the hoist shaft: its pictures show one and the same face. */
export const HOIST_SEED = 7;

/** The largest picture, above 40 megapixels. */
export const LARGE_FACE: Size = { width: 7000, height: 5740 };

/** What was photographed of the hoist shaft. */
export const hoistShaftPictures: Entry[] = [
  {
    fileName: "shaft_e1_received_01.jpg",
    technique: "camera",
    caption: "Shaft half, gear side, as received",
    size: { width: 2000, height: 1334 },
    pixelSizeUm: asReceivedPixelMm * 1000,
    resolutionInFile: false,
    draw: (size) => scaled(asReceived(size, HOIST_SEED)),
  },
  {
    fileName: "disc_origin_02.jpg",
    technique: "stereo",
    caption: "Main origin and two ratchet marks at the rim, oblique light",
    size: CAMERA,
    pixelSizeUm: 10,
    resolutionInFile: true,
    draw: (size) => face(fractureOrigin(size, HOIST_SEED)),
  },
  {
    fileName: "disc_face_03.tif",
    technique: "camera",
    caption: "Fracture face, gear side, oblique light from upper left",
    size: LARGE_FACE,
    pixelSizeUm: 11.498,
    resolutionInFile: false,
    quality: 91,
    draw: (size) => face(fractureFace(size, HOIST_SEED)),
  },
  {
    fileName: "disc_final_04.jpg",
    technique: "stereo",
    caption: "Edge of the final fracture",
    size: CAMERA,
    pixelSizeUm: 12,
    resolutionInFile: true,
    draw: (size) => face(fractureFinal(size, HOIST_SEED)),
  },
  {
    fileName: "disc_middle_05.jpg",
    technique: "stereo",
    caption: "Beach marks in the middle of the section",
    size: CAMERA,
    pixelSizeUm: 12,
    resolutionInFile: true,
    draw: (size) => face(fractureMiddle(size, HOIST_SEED)),
  },
  {
    fileName: "shaft_e1_oblique_06.jpg",
    technique: "camera",
    caption: "Shaft half, gear side, fracture at the journal fillet",
    size: CAMERA,
    resolutionInFile: false,
    draw: (size) => plain(fractureOblique(size, HOIST_SEED)),
  },
  {
    fileName: "sem_disc_striations_07.tif",
    technique: "sem_se",
    caption: "Striations at 22 mm depth",
    size: SEM,
    pixelSizeUm: striations2000.pixelSizeUm,
    resolutionInFile: true,
    draw: (size) => scaled(striations(size, 211)),
  },
  {
    fileName: "sem_disc_dimples_08.tif",
    technique: "sem_se",
    caption: "Equiaxed dimples in the final fracture",
    size: SEM,
    pixelSizeUm: dimplesPixelUm,
    resolutionInFile: true,
    draw: (size) => scaled(dimples(size, 212)),
  },
  {
    fileName: "sem_disc_striations_09.png",
    technique: "sem_se",
    caption: "Striations near the last front",
    size: SEM,
    pixelSizeUm: striations5000.pixelSizeUm,
    resolutionInFile: false,
    draw: (size) => scaled(fineStriations(size, 213)),
  },
  {
    fileName: "m1_prior_grains_10.tif",
    technique: "light_microscope",
    caption: "Core, prior austenite grain boundaries, picric acid etch",
    size: MICROGRAPH,
    pixelSizeUm: grainBoundariesPixelUm,
    resolutionInFile: true,
    draw: (size) => plain(grainBoundaries(size, 214)),
  },
  {
    fileName: "m1_martensite_11.tif",
    technique: "light_microscope",
    caption: "Core, tempered martensite, nital etch",
    size: MICROGRAPH,
    pixelSizeUm: temperedMartensitePixelUm,
    resolutionInFile: true,
    draw: (size) => plain(temperedMartensite(size, 215)),
  },
  {
    fileName: "m2_hardened_layer_12.tif",
    technique: "light_microscope",
    caption: "Hardened layer at the fillet with traverse T2, nital etch",
    size: { width: 1600, height: 1450 },
    pixelSizeUm: caseLayerPixelUm,
    resolutionInFile: true,
    draw: (size) => {
      const picture = caseLayer(size, 216);
      return { picture, truth: { caseLayer: picture.truth } };
    },
  },
];
