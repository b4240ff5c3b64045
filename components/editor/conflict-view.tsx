"use client";

import type { DraftConflict } from "@/components/forms/use-draft-saving";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { type DocumentNode, plainTextOf } from "@/lib/findings/document";
import { SECTIONS } from "@/lib/findings/sections";
import { formatTime } from "@/lib/format/dates";
import type { Draft } from "./draft";

type Props = { conflict: DraftConflict<Draft>; onKeepMine: () => void; onTakeTheirs: () => void };

/** Text of each section, in the order of the report. */
function sectionTexts(document: DocumentNode): Map<string, string> {
  const texts = new Map<string, string>();
  let key = "";
  for (const node of document.content ?? []) {
    if (node.type === "sectionHeading") key = String(node.attrs?.key ?? "");
    else texts.set(key, [texts.get(key), plainTextOf(node)].filter(Boolean).join("\n"));
  }
  return texts;
}

function copyText({ document, rootCause }: Draft): Promise<void> {
  const texts = sectionTexts(document as DocumentNode);
  const sections = SECTIONS.filter(({ key }) => texts.get(key)).map(
    ({ key, title }) => `${title}\n\n${texts.get(key)}`,
  );
  return navigator.clipboard.writeText([rootCause, ...sections].join("\n\n"));
}

/** Two people saved: both texts side by side where they differ, and the choice. Nothing is lost. */
export function ConflictView({ conflict, onKeepMine, onTakeTheirs }: Props) {
  const mine = sectionTexts(conflict.yours.document as DocumentNode);
  const theirs = sectionTexts(conflict.theirs.document as DocumentNode);
  const differing = SECTIONS.filter(({ key }) => (mine.get(key) ?? "") !== (theirs.get(key) ?? ""));
  return (
    <div className="p-4">
      <Notice
        kind="conflict"
        title="Findings were not saved."
        live="assertive"
        actions={
          <>
            <Button small look="quiet" onClick={() => void copyText(conflict.yours)}>
              Copy my text
            </Button>
            <Button small onClick={onTakeTheirs}>
              Take theirs
            </Button>
            <Button small look="primary" onClick={onKeepMine}>
              Keep mine
            </Button>
          </>
        }
      >
        {conflict.changedBy} saved at {formatTime(conflict.changedAt)}, after you opened them. Your
        text is kept here and on this device. If you take theirs, Undo brings yours back.
      </Notice>
      <div className="mt-3 grid gap-3">
        {conflict.yours.rootCause !== conflict.theirs.rootCause && (
          <Pair
            title="Root cause"
            mine={conflict.yours.rootCause}
            theirs={conflict.theirs.rootCause}
            by={conflict.changedBy}
          />
        )}
        {differing.map(({ key, title }) => (
          <Pair
            key={key}
            title={title}
            mine={mine.get(key) ?? ""}
            theirs={theirs.get(key) ?? ""}
            by={conflict.changedBy}
          />
        ))}
        {differing.length === 0 && conflict.yours.rootCause === conflict.theirs.rootCause && (
          <p className="text-13 text-ink-2">
            The words are the same; figures, styles or cited values differ.
          </p>
        )}
      </div>
    </div>
  );
}

function Pair({
  title,
  mine,
  theirs,
  by,
}: {
  title: string;
  mine: string;
  theirs: string;
  by: string;
}) {
  const side = (name: string, text: string) => (
    <div className="min-w-0 bg-surface p-3">
      <p className="text-12 text-ink-3">{name}</p>
      <p className="raw mt-1 text-13 whitespace-pre-wrap">{text || "Nothing"}</p>
    </div>
  );
  return (
    <section aria-label={title}>
      <h3 className="text-13 font-head">{title}</h3>
      <div className="mt-1 grid gap-px border border-rule-2 bg-rule md:grid-cols-2">
        {side("Yours", mine)}
        {side(by, theirs)}
      </div>
    </section>
  );
}
