"use client";

import { useRef, useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import {
  NOTE_KIND_NAMES,
  NOTE_SEVERITY_NAMES,
  NOTE_STATE_NAMES,
  type NoteReply,
  type ReviewNote,
} from "@/lib/findings/constants";
import { formatDateTime, formatDay } from "@/lib/format/dates";
import type { NoteActs } from "./note-acts";
import { ReplyForm } from "./reply-form";

const DID: Record<NoteReply["act"], string> = {
  answered: "answered",
  done: "changed the text as asked",
  reopened: "opened it again",
  withdrawn: "withdrew it",
};

type Props = {
  note: ReviewNote;
  caseId: string;
  /** Where it stands: "Hardness", "Figure of IM-03 under Hardness". */
  place: string;
  /** Its words or its figure are in the text no more. */
  isPlaceGone: boolean;
  acts: NoteActs;
  onShow: () => void;
};

/** One note with what was said to it. */
export function NoteItem({ note, caseId, place, isPlaceGone, acts, onShow }: Props) {
  const form = useActionForm<unknown>();
  const [replying, setReplying] = useState<"answered" | "reopened" | null>(null);
  const opener = useRef<HTMLButtonElement>(null);
  const isSettled = note.state !== "open";
  const { id: noteId } = note;
  const close = () => {
    setReplying(null);
    requestAnimationFrame(() => opener.current?.focus());
  };
  return (
    <li className="grid gap-1.5 border-b border-rule py-3 text-13 last:border-0">
      <p>
        <b className="font-strong">Note {note.number}</b>{" "}
        <span className="text-ink-2">
          {note.by}, <time dateTime={note.at}>{formatDay(note.at)}</time>
        </span>
      </p>
      <p className="text-12 text-ink-3">
        {NOTE_KIND_NAMES[note.kind]}, {NOTE_SEVERITY_NAMES[note.severity]}. {place}
        {isSettled && `. ${NOTE_STATE_NAMES[note.state]}`}
      </p>
      {note.passage && (
        <blockquote className="raw border-l-2 border-rule-2 pl-2 text-ink-2">
          {note.passage}
        </blockquote>
      )}
      {isPlaceGone && (
        <p className="text-12 text-ink-3">It does not stand in the text like this any more.</p>
      )}
      <p className="raw whitespace-pre-line">{note.words}</p>
      {note.replies.map((reply) => (
        <p key={reply.at} className="raw border-l-2 border-action pl-2 whitespace-pre-line">
          <span className="text-12 text-ink-3">
            {reply.by} {DID[reply.act]}, {formatDateTime(reply.at)}
          </span>
          {reply.words && <span className="block">{reply.words}</span>}
        </p>
      ))}
      {form.failure && (
        <Notice kind="bad" title="Nothing was recorded." live="assertive">
          {form.failure}
        </Notice>
      )}
      {replying ? (
        <ReplyForm
          id={noteId}
          label={replying === "answered" ? "Your answer" : "What is still open"}
          actLabel={replying === "answered" ? "Answer" : "Open again"}
          send={(words) =>
            replying === "answered"
              ? acts.answer({ caseId, noteId, act: "answered", words })
              : acts.giveBack({ caseId, noteId, act: "reopened", words })
          }
          onClose={close}
        />
      ) : (
        <span className="flex flex-wrap gap-2">
          {acts.mayAnswer && !isSettled && (
            <>
              <Button small ref={opener} onClick={() => setReplying("answered")}>
                Answer
              </Button>
              <Button
                small
                disabled={form.isBusy}
                onClick={() =>
                  form.send(
                    () => acts.answer({ caseId, noteId, act: "done", words: "" }),
                    () => undefined,
                  )
                }
              >
                Done
              </Button>
            </>
          )}
          {acts.mayLeave && isSettled && (
            <Button small ref={opener} onClick={() => setReplying("reopened")}>
              Open again
            </Button>
          )}
          {acts.mayLeave && note.state !== "withdrawn" && (
            <Button
              small
              look="quiet"
              disabled={form.isBusy}
              onClick={() =>
                form.send(
                  () => acts.giveBack({ caseId, noteId, act: "withdrawn", words: "" }),
                  () => undefined,
                )
              }
            >
              Withdraw
            </Button>
          )}
          <Button small look="quiet" onClick={onShow}>
            Show it
          </Button>
        </span>
      )}
    </li>
  );
}
