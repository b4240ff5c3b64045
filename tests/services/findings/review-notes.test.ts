import { and, asc, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditEvents } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { gateLedger } from "@/lib/cases/gates";
import { AppError } from "@/lib/errors";
import { answerNote } from "@/lib/findings/answer-note";
import { leaveNote } from "@/lib/findings/leave-note";
import { listNotes } from "@/lib/findings/list-notes";
import { recordReading } from "@/lib/findings/record-reading";
import { returnNote } from "@/lib/findings/return-note";
import { sendForSignOff } from "@/lib/findings/send-for-sign-off";
import { sendToSecondReader } from "@/lib/findings/send-to-second-reader";
import { setState } from "../../helpers/cases";
import {
  asAdministrator,
  asInvestigator,
  asLead,
  asOtherRequester,
  asSecondInvestigator,
  asTechnician,
} from "../../helpers/people";
import { aWrittenCase, theIssue, write } from "../../helpers/signable-case";

const failure = async (work: Promise<unknown>): Promise<AppError> => {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (error instanceof AppError) return error;
  throw error ?? new Error("it was not refused");
};

const NOTE = {
  section: "answer",
  passage: "broke by fatigue",
  figureId: null,
  kind: "unsupported",
  severity: "major",
  words: "Name the marks that show it.",
};

let author: Actor;
let reader: Actor;
beforeAll(async () => {
  author = await asInvestigator();
  reader = await asSecondInvestigator();
});

/** A text that waits for its second reader: "The shaft broke by fatigue." */
async function aCaseToRead(): Promise<string> {
  const caseId = await aWrittenCase();
  await sendToSecondReader(author, { caseId, readerId: reader.id });
  return caseId;
}
const notesOf = async (caseId: string) => listNotes(database(), (await theIssue(caseId)).id);
const theNote = async (caseId: string) => {
  const [note] = await notesOf(caseId);
  if (!note) throw new Error("no note");
  return note;
};
const pass = async (caseId: string, verdict: "read" | "sent_back" = "read") =>
  recordReading(reader, {
    caseId,
    verdict,
    note: verdict === "read" ? "" : "See the notes.",
    revision: (await theIssue(caseId)).revision,
  });
const readerGate = async (caseId: string) => (await gateLedger(database(), caseId))[7];
const events = (caseId: string, action: string) =>
  database()
    .select()
    .from(auditEvents)
    .where(and(eq(auditEvents.chain, caseId), eq(auditEvents.action, action)))
    .orderBy(asc(auditEvents.position));

describe("leaving a note", () => {
  it("ties it to words of the text and records who left it", async () => {
    const caseId = await aCaseToRead();
    expect(await leaveNote(reader, { ...NOTE, caseId })).toEqual({ number: 1 });
    expect(await leaveNote(reader, { ...NOTE, caseId, passage: "", section: "hardness" })).toEqual({
      number: 2,
    });
    expect(await notesOf(caseId)).toMatchObject([
      { number: 1, ...NOTE, state: "open", by: reader.name, replies: [] },
      { number: 2, passage: "", section: "hardness" },
    ]);
    expect(await events(caseId, "findings.leaveNote")).toMatchObject([
      { actorId: reader.id, subjectLabel: "note 1 on issue 1", after: NOTE },
      { subjectLabel: "note 2 on issue 1" },
    ]);
  });

  it("refuses words and figures that do not stand in the text, and one without words", async () => {
    const caseId = await aCaseToRead();
    const elsewhere = await failure(leaveNote(reader, { ...NOTE, caseId, section: "hardness" }));
    expect(elsewhere.fields?.passage).toContain("do not stand in this section");
    const figure = await failure(
      leaveNote(reader, { ...NOTE, caseId, passage: "", figureId: "img_none" }),
    );
    expect(figure.code).toBe("INVALID");
    const empty = await failure(leaveNote(reader, { ...NOTE, caseId, words: "  " }));
    expect(empty.fields?.words).toBe("Say what should change.");
    const nowhere = await failure(leaveNote(reader, { ...NOTE, caseId, section: "annex" }));
    expect(nowhere.code).toBe("INVALID");
    expect(await notesOf(caseId)).toEqual([]);
  });

  it("is for the second reader alone, while they read", async () => {
    const caseId = await aCaseToRead();
    for (const other of [author, await asLead(), await asTechnician(), await asAdministrator()]) {
      expect((await failure(leaveNote(other, { ...NOTE, caseId }))).code).toBe("NOT_ALLOWED");
    }
    expect((await failure(leaveNote(await asOtherRequester(), { ...NOTE, caseId }))).code).toBe(
      (await failure(leaveNote(await asOtherRequester(), { ...NOTE, caseId: "case_none" }))).code,
    );
    for (const state of ["analysing", "in_approval", "signed"] as const) {
      await setState(caseId, state);
      expect((await failure(leaveNote(reader, { ...NOTE, caseId }))).code).toBe("LOCKED");
    }
  });
});

describe("settling a note", () => {
  it("keeps the gate of the second reading open until each is settled", async () => {
    const caseId = await aCaseToRead();
    await leaveNote(reader, { ...NOTE, caseId });
    await leaveNote(reader, { ...NOTE, caseId, passage: "" });
    await pass(caseId);
    expect(await readerGate(caseId)).toMatchObject({
      isMet: false,
      detail: "Read, 2 notes of the reader not settled",
      mend: { verb: "Settle them" },
    });
    expect((await failure(sendForSignOff(author, { caseId }))).message).toContain("2 notes");

    const [one, two] = await notesOf(caseId);
    await answerNote(author, {
      caseId,
      noteId: one?.id,
      act: "answered",
      words: "Figure 2 shows the beach marks.",
    });
    await answerNote(author, { caseId, noteId: two?.id, act: "done", words: "" });
    expect(await readerGate(caseId)).toMatchObject({ isMet: true, detail: reader.name });
    expect(await notesOf(caseId)).toMatchObject([
      { state: "answered", replies: [{ act: "answered", by: author.name }] },
      { state: "done" },
    ]);
    expect(await events(caseId, "findings.answerNote")).toMatchObject([
      { before: { state: "open" }, after: { state: "answered" } },
      { after: { state: "done", words: "" } },
    ]);
    await sendForSignOff(author, { caseId });
  });

  it("goes on after the text was sent back and changed; the note stays though its words are gone", async () => {
    const caseId = await aCaseToRead();
    await leaveNote(reader, { ...NOTE, caseId });
    await pass(caseId, "sent_back");
    await write(author, caseId, "Beach marks show that the shaft broke slowly.");
    await answerNote(author, {
      caseId,
      noteId: (await theNote(caseId)).id,
      act: "done",
      words: "",
    });
    await sendToSecondReader(author, { caseId, readerId: reader.id });
    await returnNote(reader, {
      caseId,
      noteId: (await theNote(caseId)).id,
      act: "reopened",
      words: "Which marks?",
    });
    await pass(caseId);
    expect((await readerGate(caseId))?.isMet).toBe(false);
    await answerNote(author, {
      caseId,
      noteId: (await theNote(caseId)).id,
      act: "answered",
      words: "Those of picture 3.",
    });
    expect((await readerGate(caseId))?.isMet).toBe(true);
    expect((await theNote(caseId)).replies.map(({ act, words }) => [act, words])).toEqual([
      ["done", ""],
      ["reopened", "Which marks?"],
      ["answered", "Those of picture 3."],
    ]);
  });

  it("asks for words where they are needed", async () => {
    const caseId = await aCaseToRead();
    await leaveNote(reader, { ...NOTE, caseId });
    const { id: noteId } = await theNote(caseId);
    const silent = await failure(
      answerNote(author, { caseId, noteId, act: "answered", words: " " }),
    );
    expect(silent.fields?.words).toBe("Write the answer.");
    const unsaid = await failure(
      returnNote(reader, { caseId, noteId, act: "reopened", words: "" }),
    );
    expect(unsaid.fields?.words).toBe("Say what is still open.");
  });

  it("is not for its reader, and coming back to it is not for the author", async () => {
    const caseId = await aCaseToRead();
    await leaveNote(reader, { ...NOTE, caseId });
    const { id: noteId } = await theNote(caseId);
    const own = await failure(answerNote(reader, { caseId, noteId, act: "done", words: "" }));
    expect(own.code).toBe("NOT_ALLOWED");
    const back = await failure(returnNote(author, { caseId, noteId, act: "withdrawn", words: "" }));
    expect(back.code).toBe("NOT_ALLOWED");
    await returnNote(reader, { caseId, noteId, act: "withdrawn", words: "" });
    expect((await theNote(caseId)).state).toBe("withdrawn");
  });

  it("done twice at once is done once; the other is told and loses nothing", async () => {
    const caseId = await aCaseToRead();
    await leaveNote(reader, { ...NOTE, caseId });
    const { id: noteId } = await theNote(caseId);
    const done = { caseId, noteId, act: "done", words: "" };
    const both = await Promise.allSettled([answerNote(author, done), answerNote(author, done)]);
    expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await theNote(caseId)).replies).toHaveLength(1);
    const late = await failure(answerNote(author, done));
    expect(late).toMatchObject({ code: "CONFLICT", message: expect.stringContaining("kept here") });
  });

  it("of another case, or after signing, is refused", async () => {
    const [caseId, other] = [await aCaseToRead(), await aCaseToRead()];
    await leaveNote(reader, { ...NOTE, caseId });
    const { id: noteId } = await theNote(caseId);
    const done = { noteId, act: "done", words: "" };
    expect((await failure(answerNote(author, { ...done, caseId: other }))).code).toBe("NOT_FOUND");
    await setState(caseId, "signed");
    expect((await failure(answerNote(author, { ...done, caseId }))).code).toBe("LOCKED");
  });

  it("a second reader does not write in the text while they read it", async () => {
    const caseId = await aCaseToRead();
    const refused = await failure(write(reader, caseId, "Mine."));
    expect(refused).toMatchObject({
      code: "NOT_ALLOWED",
      message: expect.stringContaining("Leave notes beside it"),
    });
  });
});
