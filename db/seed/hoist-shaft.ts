import { placeMark } from "@/lib/images/place-mark";
import { registerItem } from "@/lib/evidence/register-item";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { saveTraverse } from "@/lib/traverses/save-traverse";
import { latestReturn } from "@/lib/traverses/read-traverses";
import { newTraverse } from "@/lib/traverses/new-traverse";
import type { TypedReading } from "@/lib/traverses/schemas";
import { stateStrength } from "@/lib/strength/state-strength";
import { database } from "@/db/client";
import type { Cast } from "./actors";
import type { StoryCase } from "./case-list";
import { setStoryTime } from "./clock";
import { addPicture, scaleFromBar, scaleFromFile } from "./pictures-of";
import { weigh } from "./reach";
import { writeFindings } from "./write-findings";

const TABLE = "steel-unalloyed-lowalloy-iso18265-a1";

/** Readings of the two traverses and the core, invented: depth mm, diagonals µm. */
const MID_JOURNAL: [number, number, number][] = [
  [0.15, 54.6, 55.0],
  [0.35, 54.4, 54.8],
  [0.6, 54.0, 54.4],
  [0.9, 54.3, 54.7],
  [1.2, 54.4, 54.8],
  [1.5, 54.7, 55.1],
  [1.8, 55.1, 55.5],
  [2.1, 55.5, 55.9],
  [2.4, 56.3, 56.9],
  [2.65, 57.9, 58.3],
  [2.85, 59.8, 60.2],
  [3.05, 62.9, 63.3],
  [3.25, 67.1, 67.5],
  [3.5, 71.9, 72.3],
  [3.8, 76.2, 76.8],
  [4.15, 78.2, 78.6],
  [4.5, 78.5, 78.9],
];
const AT_FILLET: [number, number, number][] = [
  [0.1, 56.2, 55.2],
  [0.3, 54.2, 54.6],
  [0.5, 53.6, 53.0],
  [0.7, 54.3, 54.1],
  [0.9, 54.3, 55.1],
  [1.1, 55.4, 55.0],
  [1.3, 55.6, 56.2],
  [1.5, 57.4, 56.6],
  [1.7, 60.2, 58.4],
  [1.9, 62.9, 63.5],
  [2.06, 68.5, 67.5],
  [2.3, 72.4, 72.8],
  [2.55, 76.0, 75.4],
  [2.8, 77.1, 77.9],
  [3.1, 78.6, 78.2],
  [3.5, 79.0, 78.8],
  [4.0, 78.3, 78.7],
];

const readings = (rows: [number, number, number][]): TypedReading[] =>
  rows.map(([depth, d1, d2], i) => ({
    id: `r${i + 1}`,
    depth: depth.toFixed(2),
    d1: d1.toFixed(1),
    d2: d2.toFixed(1),
  }));

/** The case that can be walked through to the signature: one pair of indents is to settle, one value is stale. */
export async function writeHoistShaft(
  cast: Cast,
  story: StoryCase,
  caseId: string,
  itemIds: readonly string[],
): Promise<void> {
  const { technician, investigator } = cast;
  const gearSide = itemIds[0] ?? null;
  setStoryTime(12, "13:05");
  const disc = await cut(
    cast,
    caseId,
    gearSide,
    "cut",
    "Fracture disc, gear side",
    "Disc 22 mm, wet cut, face protected. Mass 486.2 g of 8.94 kg.",
    "Store B3",
    486.2,
  );
  setStoryTime(11, "08:30");
  const mountCore = await cut(
    cast,
    caseId,
    disc,
    "mount",
    "Mount, core section",
    "Core section for structure and grain size.",
    "Cabinet 4",
    null,
  );
  const mountFillet = await cut(
    cast,
    caseId,
    disc,
    "mount",
    "Mount, fillet section",
    "Section through the fillet, normal to the surface.",
    "Bench 2",
    null,
  );
  await cut(
    cast,
    caseId,
    gearSide,
    "tensile_piece",
    "Tensile piece, core",
    "Turned from the core, longitudinal.",
    "Test room",
    null,
  );

  const of = (itemId: string | null, magnification?: number) => ({
    itemId,
    ...(magnification && { magnification }),
  });
  const received = await addPicture(technician, caseId, "shaft_e1_received_01.jpg", {
    ...of(gearSide, 0.5),
    isShareable: true,
  });
  await scaleFromBar(technician, received, "Steel rule in the picture");
  const origin = await addPicture(technician, caseId, "disc_origin_02.jpg", of(disc, 4));
  await scaleFromFile(technician, origin);
  const face = await addPicture(technician, caseId, "disc_face_03.tif", of(disc, 1));
  for (const [fileName, itemId, magnification] of [
    ["disc_final_04.jpg", disc, 4],
    ["sem_disc_striations_07.tif", disc, 2000],
    ["sem_disc_dimples_08.tif", disc, 1500],
    ["m1_prior_grains_10.tif", mountCore, 500],
    ["m1_martensite_11.tif", mountCore, 1000],
    ["m2_hardened_layer_12.tif", mountFillet, 50],
  ] as const) {
    await scaleFromFile(
      technician,
      await addPicture(technician, caseId, fileName, of(itemId, magnification)),
    );
  }
  await addPicture(technician, caseId, "shaft_e1_oblique_06.jpg", of(gearSide));

  setStoryTime(10, "16:10");
  await scaleFromBar(investigator, face, "Scale bar");
  const truth = face.truth.face;
  if (!truth) throw new Error("the fracture face has no geometry");
  const at = (point: { x: number; y: number }): [number, number] => [point.x, point.y];
  const imageId = face.imageId;
  const circle = Array.from({ length: 120 }, (_value, i): [number, number] => {
    const turn = (i / 120) * 2 * Math.PI;
    return [
      truth.rim.centre.x + truth.rim.radiusPx * Math.cos(turn),
      truth.rim.centre.y + truth.rim.radiusPx * Math.sin(turn),
    ];
  });
  await placeMark(investigator, {
    imageId,
    name: "Section",
    confidence: "sure",
    geometry: { tool: "area", points: circle, isOutline: true },
  });
  const key = truth.keywayDirection;
  const originMark = await placeMark(investigator, {
    imageId,
    featureCode: "ORG",
    confidence: "sure",
    geometry: {
      tool: "origin",
      point: at(truth.origin),
      radiusPx: 60,
      landmark: {
        point: [
          truth.rim.centre.x + key.x * truth.rim.radiusPx * 0.95,
          truth.rim.centre.y + key.y * truth.rim.radiusPx * 0.95,
        ],
        name: "keyway",
      },
    },
  });
  await placeMark(investigator, {
    imageId,
    featureCode: "RCH",
    geometry: {
      tool: "ratchet",
      lines: truth.ratchets.map((line): [[number, number], [number, number]] => [
        at(line.from),
        at(line.to),
      ]),
    },
  });
  for (const front of truth.fronts) {
    await placeMark(investigator, {
      imageId,
      featureCode: "BCH",
      originId: originMark.recordId,
      geometry: { tool: "front", points: front.points.filter((_point, i) => i % 4 === 0).map(at) },
    });
  }
  await placeMark(investigator, {
    imageId,
    name: "Crack depth",
    confidence: "sure",
    geometry: { tool: "length", points: [at(truth.crackDepth.from), at(truth.crackDepth.to)] },
  });
  await placeMark(investigator, {
    imageId,
    featureCode: "FFZ",
    confidence: "sure",
    geometry: {
      tool: "area",
      points: truth.finalFracture.outline.filter((_point, i) => i % 4 === 0).map(at),
    },
  });

  setStoryTime(4, "11:10");
  const fieldReturn = await latestReturn(database(), caseId);
  const asked = newTraverse(fieldReturn?.proposal);
  const plain = newTraverse();
  await createTraverse(technician, {
    caseId,
    content: {
      ...asked,
      name: "mid-journal",
      itemId: mountCore,
      tableId: TABLE,
      readings: readings(MID_JOURNAL),
    },
  });
  const rows = readings(AT_FILLET);
  if (rows[0]) rows[0].leftOutReason = "Too near the edge: 0.10 mm, 2.5 × d is 0.139 mm.";
  const firstRows = rows.map((row) =>
    row.id === "r10" ? { ...row, d1: "63.4", d2: "64.0" } : row,
  );
  const atFillet = {
    ...asked,
    name: "at fillet",
    itemId: mountFillet,
    tableId: TABLE,
    surfaceReadingIds: ["r2", "r3", "r4", "r5"],
    coreReadingIds: ["r15", "r16", "r17"],
  };
  const fillet = await createTraverse(technician, {
    caseId,
    content: { ...atFillet, readings: firstRows },
  });
  await createTraverse(technician, {
    caseId,
    content: {
      ...plain,
      name: "core grid",
      itemId: mountCore,
      tableId: TABLE,
      coreReadingIds: ["r1", "r2", "r3", "r4", "r5"],
      readings: readings([
        [20, 78.3, 78.9],
        [20.6, 78.6, 79.0],
        [21.2, 78.4, 78.6],
        [21.8, 78.9, 78.5],
        [22.4, 78.5, 78.9],
      ]),
    },
  });

  setStoryTime(3, "14:30");
  await stateStrength(investigator, {
    caseId,
    verdict: "agree",
    reason:
      "Core hardness, tensile piece and drawing agree: the core is as ordered. The shaft did not break because it was soft.",
    seenVersion: null,
  });
  await weigh(cast, story, caseId, [
    {
      code: "HC",
      detail: "in bending, at the fillet",
      verdict: "stands",
      reason:
        "Nothing speaks against it. Beach marks from several origins at the fillet over 42 mm, ratchet marks between them.",
    },
    {
      code: "HC",
      detail: "in torsion",
      verdict: "weighed_out",
      reason:
        "The face is at right angles to the axis within 2° all round; torsion fatigue of a round shaft runs at about 45°.",
    },
    {
      code: "DO",
      detail: "in one event",
      verdict: "ruled_out",
      reason: "Progressive marks cover 72 % of the face.",
    },
    {
      code: "FF",
      detail: "at the gear seat",
      verdict: "ruled_out",
      reason: "No wear and no red oxide at the gear seat.",
    },
    {
      code: "QC",
      detail: "then fatigue",
      verdict: "ruled_out",
      reason: "No scale and no temper colour on the oldest front.",
    },
    {
      code: "IH",
      detail: "from the works",
      verdict: "ruled_out",
      reason:
        "Striations and no facets between grains at the origin; the core is far below the range known to be at risk.",
    },
  ]);

  setStoryTime(2, "16:45");
  await writeFindings(
    investigator,
    caseId,
    "Bending fatigue from the journal fillet, where the induction hardened layer stopped short of the place of highest stress.",
    {
      answer: [
        [
          "The shaft broke by bending fatigue. Cracks began at several places along the gear-side journal fillet and ran to ",
          { tag: `D1 · ${face.label}`, field: "length" },
          " before the rest, ",
          { tag: `A2 · ${face.label}`, field: "share" },
          " of the section, gave way.",
        ],
        [
          "At the fillet the hardened layer is ",
          { tag: "T2", field: "caseDepth" },
          " deep, less than the drawing asks. How far the fillet radius adds to it cannot be said from these pieces.",
        ],
      ],
      scope: [
        [
          "Why the shaft broke, and whether shafts of the same heat can stay in service. Cutting was allowed; one mating half is kept whole.",
        ],
      ],
      background: [
        [
          "As stated by Harrow Bay Lifting Gear, not verified: ",
          { tag: "F1", field: "hoursInService" },
          " in service at ",
          { tag: "F1", field: "speedPerMinute" },
          ", a knock for two shifts before the drum stopped.",
        ],
      ],
      sent: [
        [
          "Two shaft halves, a bearing ring and an oil sample. The faces had not been fitted together; light rust on the gear side.",
        ],
      ],
      custody: [
        [
          "Unbroken from receipt. The owner allowed the cut through the gear-side half; the other half was not cut.",
        ],
      ],
      methods: [
        [
          "Visual examination, stereo and electron microscope, sections ground and etched, hardness by Vickers HV1 (ISO 6507-1), case depth by ISO 18203. Nothing departed from these.",
        ],
      ],
      fractography: [
        [
          "The face is flat and at right angles to the axis. ",
          { tag: `R1 · ${face.label}`, field: "count" },
          " ratchet marks lie along the fillet; the beach marks grow from the side of the main origin.",
        ],
        {
          figure: face.imageId,
          caption:
            "E1.1, fracture face, gear side, oblique light from upper left. Ring: origin. Blue: crack fronts. Orange: edge of final fracture.",
        },
      ],
      hardness: [
        [
          "Traverse T1, at mid-journal, gives a hardening depth of ",
          { tag: "T1", field: "caseDepth" },
          ", inside the required range. At the fillet, traverse T2 gives ",
          { tag: "T2", field: "caseDepth" },
          ", below it. The core is ",
          { tag: "T3", field: "coreHardness" },
          ".",
        ],
        {
          chart: fillet.traverseId,
          caption: "Hardness against depth, T2 at fillet. Bars are expanded uncertainty, k = 2.",
        },
      ],
      microstructure: [
        ["Mount M1, from the core, shows tempered martensite with no free ferrite."],
      ],
      strength: [["Core hardness and the drawing agree. The core is not the cause."]],
      weighing: [
        [
          "Bending fatigue stands with nothing against it. Torsion fatigue is weighed out by the lie of the face; overload, fretting, a quench crack and hydrogen are ruled out.",
        ],
      ],
      conclusions: [
        {
          list: [
            ["Established: bending fatigue from several origins at the journal fillet."],
            ["Probable: the hardened layer ending short of the fillet let the cracks start."],
          ],
        },
      ],
      limitations: [["One shaft was examined. Conversions are for comparison only."]],
      actions: [
        {
          list: [
            [
              "Withdraw HB-2210 shafts of heat 7K3391 until the fillet is inspected. Owner: Harrow Bay. Check: magnetic particles.",
            ],
            [
              "Harden through the fillet. Owner: the forge. Check: traverse at the fillet on the first part.",
            ],
          ],
        },
      ],
      disposition: [["All items are held at the laboratory for five years after signing."]],
    },
  );

  setStoryTime(1, "11:24");
  await saveTraverse(technician, {
    caseId,
    traverseId: fillet.traverseId,
    seenVersion: fillet.version,
    content: { ...atFillet, readings: rows },
  });
}

async function cut(
  cast: Cast,
  caseId: string,
  parentId: string | null,
  kind: "cut" | "mount" | "tensile_piece",
  name: string,
  reason: string,
  toPlace: string,
  massG: number | null,
): Promise<string> {
  const item = await registerItem(cast.technician, {
    caseId,
    kind,
    parentId,
    content: {
      name,
      description: "",
      condition: ["dry"],
      hazards: ["sharp edges"],
      massG,
      seal: "",
    },
    fromPlace: "Saw room",
    toPlace,
    reason,
    at: new Date().toISOString(),
  });
  return item.itemId;
}
