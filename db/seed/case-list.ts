import type { AnyValue } from "@/lib/intake/answers";
import type { FieldKey } from "@/lib/intake/fields";
import type { HoldKind, Priority } from "@/lib/cases/constants";
import type { Firm, PersonKey } from "./people";

/** How far a case of the demonstration has come. */
export type Reached =
  | "submitted"
  | "info_needed"
  | "declined"
  | "accepted"
  | "examining"
  | "weighing"
  | "in_review"
  | "released"
  | "closed";

export type StoryCase = {
  number: number;
  firm: Firm;
  requester: PersonKey;
  investigator: PersonKey;
  reached: Reached;
  /** Days before today on which it was sent. */
  sentDaysAgo: number;
  /** Days from today on which it is due. */
  dueInDays: number;
  priority: Priority;
  hold?: { kind: HoldKind; reason: string };
  declineReason?: string;
  question?: string;
  answers: Partial<Record<FieldKey, AnyValue>>;
  items: { name: string; kind?: "part" | "fluid" | "debris" }[];
};

const moment = (daysAgo: number): AnyValue => ({
  date: new Date(Date.now() - daysAgo * 86_400_000).toISOString().slice(0, 10),
  time: "09:30",
  zone: "Europe/London",
});

/** Facts every field return needs, filled for the invented firms. */
function part(
  name: string,
  headline: string,
  material: string,
  condition: string,
  drawing: string,
  more: Partial<Record<FieldKey, AnyValue>> & {
    foundDaysAgo: number;
    words: string;
    pieces: string[];
  },
): Partial<Record<FieldKey, AnyValue>> {
  const { foundDaysAgo, words, pieces, ...rest } = more;
  return {
    partName: name,
    headline,
    drawingNumber: drawing,
    drawingRevision: "B",
    grade: material,
    condition,
    foundAt: moment(foundDaysAgo),
    eventWords: words,
    place: "Main site",
    quantityFailed: "1",
    loadingKinds: ["bending"],
    decision: "Whether the parts still running can stay in service.",
    neededByReason: "The next planned stop.",
    handledBy: "Our fitters, with gloves",
    storedHow: "Dry, wrapped in plastic film",
    suspects: ["fatigue"],
    pieces: pieces.map((piece) => ({
      name: piece,
      kind: "failed_part",
      quantity: "1",
      condition: "as found",
    })),
    ...rest,
  };
}

/** The cases around the hoist shaft; parts, firms and readings are invented. */
export const STORY_CASES: readonly StoryCase[] = [
  {
    number: 112,
    firm: "harrow",
    requester: "harrowRequester",
    investigator: "investigator",
    reached: "closed",
    sentDaysAgo: 96,
    dueInDays: -66,
    priority: "P3",
    answers: part(
      "Winch drum bolt",
      "Winch drum bolt, head broken off",
      "34CrMo4",
      "+QT 10.9",
      "HB-1180",
      {
        foundDaysAgo: 99,
        words: "One of eight bolts was found without its head at the yearly inspection.",
        pieces: ["Bolt shank", "Bolt head"],
      },
    ),
    items: [{ name: "Bolt shank" }, { name: "Bolt head" }],
  },
  {
    number: 127,
    firm: "orrin",
    requester: "orrinRequester",
    investigator: "investigator",
    reached: "in_review",
    sentDaysAgo: 34,
    dueInDays: -4,
    priority: "P2",
    answers: part(
      "Drive pinion",
      "Drive pinion, two teeth broken",
      "18CrNiMo7-6",
      "case hardened",
      "OP-3307",
      {
        foundDaysAgo: 37,
        words:
          "Noise for one shift, then two neighbouring teeth lay in the gearbox. Chips in the oil.",
        pieces: ["Pinion", "Two teeth", "Oil sample"],
        caseDepth: { process: "carburized", definition: "CHD", min: "0.8", max: "1.2" },
        surfaceHardness: { scale: "HRC", min: "58", max: "62", location: "tooth flank" },
      },
    ),
    items: [
      { name: "Pinion" },
      { name: "Broken teeth, two" },
      { name: "Oil sample, 100 ml", kind: "fluid" },
    ],
  },
  {
    number: 129,
    firm: "orrin",
    requester: "orrinRequester",
    investigator: "secondInvestigator",
    reached: "released",
    sentDaysAgo: 31,
    dueInDays: -14,
    priority: "P3",
    answers: part(
      "Impeller",
      "Impeller, cavitation at inlet edge",
      "CuAl10Fe5Ni5-C",
      "as cast",
      "OP-2210",
      {
        foundDaysAgo: 40,
        words: "Delivery fell slowly over a year. The inlet edges look like sponge.",
        pieces: ["Impeller"],
        suspects: ["wear"],
      },
    ),
    items: [{ name: "Impeller" }],
  },
  {
    number: 131,
    firm: "vale",
    requester: "valeRequester",
    investigator: "investigator",
    reached: "weighing",
    sentDaysAgo: 28,
    dueInDays: -5,
    priority: "P2",
    hold: {
      kind: "waiting_external",
      reason: "Residual stress measurement at an outside laboratory, back on Friday.",
    },
    answers: part(
      "Coil spring",
      "Coil spring, broken in first active coil",
      "54SiCr6",
      "+QT",
      "LV-0417",
      {
        foundDaysAgo: 30,
        words: "Found at the daily walk-round; the car had run the day before without complaint.",
        pieces: ["Spring, two pieces"],
        loadingKinds: ["torsion"],
      },
    ),
    items: [{ name: "Spring, lower piece" }, { name: "Spring, upper piece" }],
  },
  {
    number: 134,
    firm: "harrow",
    requester: "harrowRequester",
    investigator: "investigator",
    reached: "released",
    sentDaysAgo: 27,
    dueInDays: -11,
    priority: "P2",
    answers: part("Boom pin", "Boom pin, broken at grease hole", "42CrMo4", "+QT", "HB-1904", {
      foundDaysAgo: 29,
      words:
        "The boom dropped by a hand's width on lifting. The pin was in two pieces at the cross hole.",
      pieces: ["Pin, two halves"],
      hoursInService: "6400",
      tensileStrengthMPa: { min: "900", max: "1100" },
    }),
    items: [{ name: "Pin half, head side" }, { name: "Pin half, nut side" }],
  },
  {
    number: 138,
    firm: "saltmarsh",
    requester: "saltmarshRequester",
    investigator: "secondInvestigator",
    reached: "examining",
    sentDaysAgo: 19,
    dueInDays: 13,
    priority: "P3",
    answers: part(
      "Heat exchanger tube",
      "Heat exchanger tube, through-wall pit",
      "1.4404",
      "solution annealed",
      "SD-88",
      {
        foundDaysAgo: 22,
        words: "Milk on the water side. One tube of 240 leaks at a pit near the tube sheet.",
        pieces: ["Tube length, 300 mm"],
        suspects: ["corrosion", "deposits"],
      },
    ),
    items: [{ name: "Tube length, 300 mm" }, { name: "Deposit in vial", kind: "debris" }],
  },
  {
    number: 139,
    firm: "tessel",
    requester: "tesselRequester",
    investigator: "secondInvestigator",
    reached: "weighing",
    sentDaysAgo: 18,
    dueInDays: 3,
    priority: "P1",
    answers: part(
      "M36 bolts",
      "M36 bolts ×4, broken under head",
      "34CrNiMo6, 10.9",
      "+QT, zinc flake",
      "TW-5521",
      {
        foundDaysAgo: 20,
        words:
          "Four of 72 bolts lay on the platform nine days after tightening. Fracture under the head.",
        pieces: ["Bolt 1", "Bolt 2", "Bolt 3", "Bolt 4", "Two sound bolts"],
        suspects: ["hydrogen"],
        quantityFailed: "4",
        loadingKinds: ["axial"],
      },
    ),
    items: [
      { name: "Bolt 1" },
      { name: "Bolt 2" },
      { name: "Bolt 3" },
      { name: "Bolt 4" },
      { name: "Sound bolts, two" },
    ],
  },
  {
    number: 140,
    firm: "harrow",
    requester: "harrowRequester",
    investigator: "thirdInvestigator",
    reached: "examining",
    sentDaysAgo: 16,
    dueInDays: 10,
    priority: "P3",
    answers: part(
      "Wire rope socket",
      "Wire rope socket, cracked at neck",
      "G26CrMo4",
      "+QT",
      "HB-0771",
      {
        foundDaysAgo: 18,
        words: "Crack seen at the yearly inspection, about a third of the way round the neck.",
        pieces: ["Socket"],
        howFound: "inspection",
      },
    ),
    items: [{ name: "Socket" }],
  },
  {
    number: 141,
    firm: "vale",
    requester: "valeRequester",
    investigator: "thirdInvestigator",
    reached: "examining",
    sentDaysAgo: 15,
    dueInDays: 14,
    priority: "P3",
    answers: part(
      "Track bracket weld",
      "Track bracket weld, cracked from toe",
      "S355J2+N",
      "+N",
      "LV-2203",
      {
        foundDaysAgo: 21,
        words: "Crack along the toe of a fillet weld, 40 mm long, found on walking the track.",
        pieces: ["Bracket with weld"],
        howFound: "inspection",
      },
    ),
    items: [{ name: "Bracket with weld" }],
  },
  {
    number: 142,
    firm: "harrow",
    requester: "harrowRequester",
    investigator: "investigator",
    reached: "weighing",
    sentDaysAgo: 14,
    dueInDays: 10,
    priority: "P2",
    answers: part(
      "Hoist drum shaft",
      "Hoist shaft, broken at journal fillet",
      "42CrMo4",
      "+QT",
      "HB-2210",
      {
        foundDaysAgo: 16,
        words:
          "Crane 3, main hoist. Operator heard a knock on lowering for two shifts, then the drum stopped turning with 6 t on the hook. The brake held. Shaft found parted at the gear-side journal. Bearing changed in August.",
        pieces: [
          "Shaft half, gear side",
          "Shaft half, drum side",
          "Bearing, inner ring",
          "Oil sample, 100 ml",
        ],
        drawingRevision: "D",
        serialNumber: "HB2210-0418",
        heatNumber: "7K3391",
        maker: "Fenwright Forge",
        madeWhen: "March 2023",
        hoursInService: "11400",
        speedPerMinute: "25",
        loadingKinds: ["bending", "torsion"],
        tensileStrengthMPa: { min: "900", max: "1100" },
        surfaceHardness: {
          scale: "HV1",
          min: "560",
          max: "",
          location: "journal, hardened length",
        },
        caseDepth: { process: "induction", definition: "SHD", min: "2.5", max: "4.0" },
        keyRadii: "journal fillet R 3.0 mm",
        quantityInstalled: "3",
      },
    ),
    items: [
      { name: "Shaft half, gear side" },
      { name: "Shaft half, drum side" },
      { name: "Bearing, inner ring" },
      { name: "Oil sample, 100 ml", kind: "fluid" },
    ],
  },
  {
    number: 143,
    firm: "vale",
    requester: "valeRequester",
    investigator: "thirdInvestigator",
    reached: "examining",
    sentDaysAgo: 12,
    dueInDays: 14,
    priority: "P3",
    answers: part(
      "Brake disc bolt M14",
      "Brake disc bolt M14, loose and broken",
      "8.8, zinc flake",
      "+QT",
      "LV-1010",
      {
        foundDaysAgo: 13,
        words: "One bolt loose, its neighbour broken in the first engaged thread.",
        pieces: ["Bolt, two pieces", "Neighbouring bolt"],
        loadingKinds: ["axial", "bending"],
      },
    ),
    items: [{ name: "Bolt, broken" }, { name: "Bolt, loose" }],
  },
  {
    number: 144,
    firm: "orrin",
    requester: "orrinRequester",
    investigator: "investigator",
    reached: "accepted",
    sentDaysAgo: 9,
    dueInDays: 21,
    priority: "P3",
    answers: part(
      "Pump shaft",
      "Pump shaft, fretted at impeller seat",
      "1.4057",
      "+QT 800",
      "OP-1120",
      {
        foundDaysAgo: 12,
        words: "Red-brown powder at the seat when the impeller was drawn.",
        pieces: ["Shaft"],
        suspects: ["wear"],
      },
    ),
    items: [{ name: "Shaft" }],
  },
  {
    number: 145,
    firm: "tessel",
    requester: "tesselRequester",
    investigator: "secondInvestigator",
    reached: "accepted",
    sentDaysAgo: 8,
    dueInDays: 17,
    priority: "P2",
    answers: part(
      "Blade bearing bolt M36",
      "Blade bearing bolt M36, cracked thread",
      "34CrNiMo6, 10.9",
      "+QT",
      "TW-5524",
      {
        foundDaysAgo: 11,
        words: "Indication at ultrasonic inspection, 30 mm from the nut.",
        pieces: ["Bolt"],
        howFound: "inspection",
        loadingKinds: ["axial"],
      },
    ),
    items: [{ name: "Bolt" }],
  },
  {
    number: 146,
    firm: "orrin",
    requester: "orrinRequester",
    investigator: "investigator",
    reached: "accepted",
    sentDaysAgo: 7,
    dueInDays: 21,
    priority: "P3",
    hold: { kind: "customer", reason: "Waiting for the second half of the hub." },
    answers: part(
      "Gear coupling hub",
      "Gear coupling hub, keyway crack",
      "42CrMo4",
      "+QT",
      "OP-4002",
      {
        foundDaysAgo: 10,
        words: "Crack from the corner of the keyway, seen when the coupling was opened.",
        pieces: ["Hub, one half"],
        loadingKinds: ["torsion"],
      },
    ),
    items: [{ name: "Hub, one half" }],
  },
  {
    number: 147,
    firm: "harrow",
    requester: "harrowRequester",
    investigator: "investigator",
    reached: "submitted",
    sentDaysAgo: 1,
    dueInDays: 38,
    priority: "P2",
    answers: part("Hoist drum shaft", "Hoist shaft, second return", "42CrMo4", "+QT", "HB-2210", {
      foundDaysAgo: 2,
      words: "Crack at the same fillet, found by magnetic particles after the first shaft broke.",
      pieces: ["Shaft"],
      howFound: "inspection",
      loadingKinds: ["bending", "torsion"],
    }),
    items: [],
  },
  {
    number: 148,
    firm: "vale",
    requester: "valeRequester",
    investigator: "thirdInvestigator",
    reached: "info_needed",
    sentDaysAgo: 1,
    dueInDays: 38,
    priority: "P3",
    question: "Was the spring eye shot-peened after forging, and is there a record of it?",
    answers: part("Leaf spring eye", "Leaf spring eye, broken", "51CrV4", "+QT", "LV-0090", {
      foundDaysAgo: 3,
      words: "The main leaf parted through the eye on a level crossing.",
      pieces: ["Leaf end with eye"],
    }),
    items: [],
  },
  {
    number: 149,
    firm: "vale",
    requester: "valeRequester",
    investigator: "thirdInvestigator",
    reached: "declined",
    sentDaysAgo: 1,
    dueInDays: 38,
    priority: "P4",
    declineReason:
      "The part is plastic. This laboratory examines metal parts; we named two that can help.",
    answers: part("Seat bracket", "Seat bracket, cracked", "PA6-GF30", "moulded", "LV-7781", {
      foundDaysAgo: 6,
      words: "Cracks in three of sixty brackets after a cold week.",
      pieces: ["Three brackets"],
      suspects: ["overload"],
      quantityFailed: "3",
    }),
    items: [],
  },
  {
    number: 150,
    firm: "tessel",
    requester: "tesselRequester",
    investigator: "secondInvestigator",
    reached: "submitted",
    sentDaysAgo: 0,
    dueInDays: 42,
    priority: "P3",
    answers: part(
      "Yaw motor pinion",
      "Yaw motor pinion, pitting",
      "18CrNiMo7-6",
      "case hardened",
      "TW-3015",
      {
        foundDaysAgo: 5,
        words: "Pits along the pitch line on all teeth, found at the yearly inspection.",
        pieces: ["Pinion"],
        howFound: "inspection",
        suspects: ["wear"],
      },
    ),
    items: [],
  },
];
