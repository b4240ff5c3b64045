import sharp from "sharp";
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { records } from "@/db/schema";
import { assignPeople } from "@/lib/cases/assign-people";
import { describeItem } from "@/lib/evidence/describe-item";
import { registerItem } from "@/lib/evidence/register-item";
import { answerNote } from "@/lib/findings/answer-note";
import { leaveNote } from "@/lib/findings/leave-note";
import { recordReading } from "@/lib/findings/record-reading";
import { returnNote } from "@/lib/findings/return-note";
import { sendBack } from "@/lib/findings/send-back";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { calibrateImage } from "@/lib/images/calibrate-image";
import { changeMark } from "@/lib/images/change-mark";
import { deleteMark } from "@/lib/images/delete-mark";
import { describeImage } from "@/lib/images/describe-image";
import { placeMark } from "@/lib/images/place-mark";
import { withdrawImage } from "@/lib/images/withdraw-image";
import { weighMechanism } from "@/lib/mechanisms/weigh-mechanism";
import { withdrawMechanism } from "@/lib/mechanisms/withdraw-mechanism";
import { signReport } from "@/lib/reports/sign-report";
import { stateStrength } from "@/lib/strength/state-strength";
import { createTraverse } from "@/lib/traverses/create-traverse";
import { saveTraverse } from "@/lib/traverses/save-traverse";
import { withdrawTraverse } from "@/lib/traverses/withdraw-traverse";
import { addImageBytes } from "@/lib/uploads/add-bytes";
import { startUpload } from "@/lib/uploads/start-upload";
import { asInvestigator, asLead, asSecondInvestigator, asTechnician } from "../../helpers/people";
import { startInput } from "../../helpers/send-file";
import {
  aWrittenCase,
  haveRead,
  leadSignedIn,
  signature,
  theIssue,
  write,
} from "../../helpers/signable-case";
import { aTraverse } from "../traverses/sample-traverse";

const POINT = { tool: "note", point: [20, 20] };
const ITEM = {
  name: "Shaft half",
  description: "",
  condition: ["dry"],
  hazards: [],
  massG: null,
  seal: "40002",
};
const MECHANISM = {
  code: "DO",
  detail: "",
  verdict: "ruled_out",
  reason: "No dimples at the origin.",
};

async function recordOf(caseId: string, kind: string): Promise<string> {
  const rows = await database().select().from(records).where(eq(records.caseId, caseId));
  const found = rows.find((row) => row.kind === kind);
  if (!found) throw new Error(`there is no ${kind}`);
  return found.id;
}

/** A signed case, and every verb that could change what its report rests on. */
export async function aSignedCase() {
  const [investigator, technician, reader, lead] = await Promise.all([
    asInvestigator(),
    asTechnician(),
    asSecondInvestigator(),
    asLead(),
  ]);
  const caseId = await aWrittenCase();
  const bytes = await sharp({ create: { width: 80, height: 60, channels: 3, background: "#777" } })
    .png()
    .toBuffer();
  const { imageId } = await addImageBytes(technician, {
    caseId,
    fileName: "face.png",
    mediaType: "image/png",
    bytes,
    details: { technique: "stereo" },
  });
  const mark = await placeMark(technician, { imageId, geometry: POINT });
  const traverse = await createTraverse(technician, { caseId, content: aTraverse() });
  await haveRead(caseId);
  await sendForSignOff(investigator, { caseId });
  const signer = await leadSignedIn();
  await signReport(signer.lead, signer.signInId, await signature(caseId));
  const [itemId, mechanismId, { revision, id: issueId }] = await Promise.all([
    recordOf(caseId, "item"),
    recordOf(caseId, "mechanism"),
    theIssue(caseId),
  ]);
  const at = new Date().toISOString();
  const scale = {
    source: "two_points",
    standard: "Scale bar",
    points: [
      [5, 5],
      [65, 5],
    ],
    knownDistanceMm: 1,
    knownDistanceUncertaintyMm: 0.01,
  };
  const verbs: Record<string, () => Promise<unknown>> = {
    "write the findings": () => write(investigator, caseId, "Another text."),
    "send to the second reader": () =>
      sendToSecondReader(investigator, { caseId, readerId: reader.id }),
    "record a reading": () =>
      recordReading(reader, { caseId, verdict: "read", note: "", revision }),
    "leave a note": () =>
      leaveNote(reader, {
        caseId,
        section: "answer",
        passage: "",
        figureId: null,
        kind: "error",
        severity: "major",
        words: "Say more.",
      }),
    "answer a note": () =>
      answerNote(investigator, { caseId, noteId: "note_none", act: "done", words: "" }),
    "withdraw a note": () =>
      returnNote(reader, { caseId, noteId: "note_none", act: "withdrawn", words: "" }),
    "send for sign-off": () => sendForSignOff(investigator, { caseId }),
    "send back": () => sendBack(lead, { caseId, note: "Change it." }),
    "sign again": async () => signReport(signer.lead, signer.signInId, await signature(caseId)),
    "register an item": () =>
      registerItem(technician, {
        caseId,
        kind: "part",
        parentId: null,
        content: ITEM,
        fromPlace: "The client",
        toPlace: "Store B1",
        reason: "Came later.",
        at,
      }),
    "describe an item": () =>
      describeItem(technician, { caseId, itemId, seenVersion: 1, content: ITEM, reason: "Seal." }),
    "start an upload": () =>
      startUpload(technician, startInput({ caseId, fileName: "later.png", bytes })),
    "describe a picture": () =>
      describeImage(technician, {
        imageId,
        seenVersion: 1,
        content: {
          caption: "Another",
          technique: "stereo",
          itemId: null,
          face: "",
          magnification: null,
          takenOn: null,
        },
        isShareable: false,
      }),
    "withdraw a picture": () => withdrawImage(technician, { imageId, reason: "Blurred." }),
    "set a scale": () => calibrateImage(technician, { imageId, seenVersion: null, ...scale }),
    "place a mark": () => placeMark(technician, { imageId, geometry: POINT }),
    "change a mark": () =>
      changeMark(technician, { markId: mark.recordId, seenVersion: 1, geometry: POINT, note: "x" }),
    "delete a mark": () => deleteMark(technician, { markId: mark.recordId, seenVersion: 1 }),
    "add a traverse": () => createTraverse(technician, { caseId, content: aTraverse() }),
    "change a traverse": () =>
      saveTraverse(technician, {
        caseId,
        traverseId: traverse.traverseId,
        seenVersion: 1,
        content: aTraverse({ name: "elsewhere" }),
      }),
    "withdraw a traverse": () =>
      withdrawTraverse(technician, { caseId, traverseId: traverse.traverseId, reason: "Wrong." }),
    "state the strength": () =>
      stateStrength(investigator, {
        caseId,
        verdict: "not_applicable",
        reason: "Another reason than before.",
        seenVersion: 1,
      }),
    "weigh a mechanism": () =>
      weighMechanism(investigator, {
        caseId,
        recordId: null,
        seenVersion: null,
        content: MECHANISM,
      }),
    "withdraw a mechanism": () =>
      withdrawMechanism(investigator, { caseId, recordId: mechanismId, reason: "Wrong." }),
    "name other people": () =>
      assignPeople(lead, {
        caseId,
        leadId: lead.id,
        investigatorId: investigator.id,
        secondReaderId: reader.id,
        technicianIds: [technician.id],
        dueOn: "2031-01-31",
        priority: "P3",
      }),
  };
  return { caseId, issueId, verbs };
}
