"use client";

import { useEffect, useEffectEvent, useRef, useState } from "react";
import { flushSync } from "react-dom";
import type { Content, Editor } from "@tiptap/react";
import { AsideNotices } from "@/components/forms/aside-notices";
import { DraftNotices } from "@/components/forms/draft-notices";
import { Notice } from "@/components/ui/notice";
import type { DocumentNode } from "@/lib/findings/document";
import type { ReviewNote } from "@/lib/findings/constants";
import { routes } from "@/lib/routes";
import { BesideText } from "./beside-text";
import { CitePanel, type CitableValue } from "./cite-panel";
import { ConflictView } from "./conflict-view";
import {
  keepOldValue,
  putInChart,
  putInPicture,
  putInValue,
  showPart,
  takeNewValues,
  takeOut,
} from "./edit-parts";
import { FindingsProvider } from "./findings-context";
import { FindingsHead } from "./findings-head";
import { FindingsSheet } from "./findings-sheet";
import { FlaggedPanel } from "./flagged-panel";
import { flaggedPhrases } from "./flagged-phrases";
import { InsertDialogs, type Picking } from "./insert-dialogs";
import type { NoteActs } from "./notes/note-acts";
import { showNotes } from "./notes/note-marks";
import { type NotesHandle, NotesPanel } from "./notes/notes-panel";
import { StalePanel } from "./stale-panel";
import { Toolbar } from "./toolbar";
import { unsettledValues } from "./unsettled-values";
import { useFindingsDraft } from "./use-findings-draft";
import { useFindingsText } from "./use-findings-text";
import {
  type CitedState,
  type PictureSource,
  type TraverseSource,
  useSources,
} from "./use-sources";
import { WithdrawnPanel } from "./withdrawn-panel";

export type FindingsEditorProps = {
  caseId: string;
  caseNumber: string;
  issueNumber: number;
  revision: number;
  document: DocumentNode;
  rootCause: string;
  savedAt: string | null;
  citable: CitableValue[];
  cited: CitedState[];
  pictures: PictureSource[];
  traverses: TraverseSource[];
  notes: ReviewNote[];
  noteActs: NoteActs;
  isSigned: boolean;
  refusal: string | null;
  /** Parts of the report that the portal makes from the records, on paper of their own. */
  annexes: React.ReactNode;
};

/** The findings as a sheet of paper, with what can be cited beside it. */
export function FindingsEditor(props: FindingsEditorProps) {
  const { caseId, citable, pictures, traverses, refusal } = props;
  const isReadOnly = refusal !== null;
  const search = useRef<HTMLInputElement>(null);
  const editorRef = useRef<Editor>(null);
  const notesPanel = useRef<NotesHandle>(null);
  const [cited, setCited] = useState(props.cited);
  const [picking, setPicking] = useState<Picking>(null);
  const [isRailOpen, setRailOpen] = useState(false);
  const sources = useSources(cited, pictures, traverses);

  const draft = useFindingsDraft({ ...props, isReadOnly, onSaved: setCited }, (document) =>
    editorRef.current?.commands.setContent(document as Content, { emitUpdate: false }),
  );
  const { saving } = draft;
  const { state } = saving;

  function openSearch() {
    // On a narrow screen the list is closed until it is asked for, and a closed one takes no focus.
    flushSync(() => setRailOpen(true));
    search.current?.focus();
  }
  function leaveSearch(written?: string) {
    setRailOpen(false);
    editor?.view.focus();
    if (written) editor?.commands.insertContent(written);
  }
  const editor = useFindingsText({
    document: draft.opening,
    isReadOnly,
    onWrite: (document) => draft.write({ document }),
    onCite: openSearch,
  });
  useEffect(() => {
    editorRef.current = editor;
  }, [editor]);
  const { notes, noteActs } = props;
  useEffect(() => {
    // What is settled is in the list beside the text; in the text it would only be in the way.
    if (editor)
      showNotes(
        editor,
        notes.filter(({ state }) => state === "open"),
      );
  }, [editor, notes]);

  const { stale, withdrawn } = editor
    ? unsettledValues(editor, sources.citedLook, citable)
    : { stale: [], withdrawn: [] };
  const openNotes = notes.filter(({ state }) => state === "open").length;
  const show = (position: number) => editor && showPart(editor, position);
  const saveAgain = () => void saving.saveNow();

  const onKeyDown = useEffectEvent((event: KeyboardEvent) => {
    if ((event.ctrlKey || event.metaKey) && event.key === "s") {
      event.preventDefault();
      saveAgain();
    }
    if (event.ctrlKey && event.altKey && event.key.toLowerCase() === "m" && noteActs.mayLeave) {
      event.preventDefault();
      flushSync(() => setRailOpen(true));
      notesPanel.current?.leave();
    }
    if (event.altKey && event.key === "ArrowDown" && stale[0]) {
      event.preventDefault();
      const from = editor?.state.selection.from ?? 0;
      show((stale.find((value) => value.position > from) ?? stale[0]).position);
    }
  });
  useEffect(() => {
    // Anywhere on the page: who reads chooses words without the focus going to the text.
    window.addEventListener("keydown", onKeyDown);
    return () => window.removeEventListener("keydown", onKeyDown);
  }, []);

  return (
    <FindingsProvider value={sources}>
      <div className="grid min-h-full xl:grid-cols-[minmax(0,1fr)_20rem]">
        <div className="min-w-0 bg-desk">
          {editor && !isReadOnly && (
            <Toolbar
              editor={editor}
              onCite={openSearch}
              onFigure={() => setPicking("picture")}
              onChart={() => setPicking("chart")}
            />
          )}
          <div className="grid gap-2 px-4 pt-3">
            <FindingsHead
              caseId={caseId}
              issueNumber={props.issueNumber}
              isSigned={props.isSigned}
              state={state}
              keepsCopy={saving.keepsCopy}
              toSettle={stale.length + withdrawn.length + openNotes}
              isRailOpen={isRailOpen}
              onRail={() => setRailOpen(!isRailOpen)}
            />
            {refusal && (
              <Notice kind="readonly" title="Read only.">
                {refusal}
              </Notice>
            )}
            <DraftNotices
              notSaved="Findings were not saved."
              state={state}
              keepsCopy={saving.keepsCopy}
              changes={draft.changes}
              signInHref={routes.signIn(routes.findings(caseId))}
              onTryAgain={saveAgain}
            />
            <AsideNotices
              what="Text"
              aside={draft.aside}
              revision={saving.revision}
              onForget={draft.forget}
              onPutBack={draft.putBack}
            />
          </div>
          {state.kind === "conflict" && (
            <ConflictView
              conflict={state.conflict}
              onKeepMine={() => saving.overrule(state.conflict.theirs.revision)}
              onTakeTheirs={draft.takeTheirs}
            />
          )}
          <FindingsSheet
            caseNumber={props.caseNumber}
            issueNumber={props.issueNumber}
            isSigned={props.isSigned}
            isReadOnly={isReadOnly}
            rootCause={draft.rootCause}
            onRootCause={(rootCause) => draft.write({ rootCause })}
            editor={editor}
          />
          {props.annexes}
        </div>
        <BesideText isOpen={isRailOpen} onClose={() => setRailOpen(false)}>
          <StalePanel
            stale={stale}
            isReadOnly={isReadOnly}
            onShow={show}
            onTake={(values) => editor && takeNewValues(editor, values)}
            onKeep={(value, reason) => editor && keepOldValue(editor, value.position, reason)}
          />
          <WithdrawnPanel
            withdrawn={withdrawn}
            isReadOnly={isReadOnly}
            onShow={show}
            onTakeOut={(position) => editor && takeOut(editor, position)}
          />
          {editor && (
            <NotesPanel
              ref={notesPanel}
              caseId={caseId}
              notes={notes}
              acts={noteActs}
              editor={editor}
              onShow={show}
            />
          )}
          <CitePanel
            values={citable}
            search={search}
            isReadOnly={isReadOnly}
            onCite={(value) => {
              if (editor) putInValue(editor, value);
              setRailOpen(false);
            }}
            onLeave={leaveSearch}
          />
          {editor && (
            <FlaggedPanel phrases={flaggedPhrases(`${draft.rootCause}\n${editor.getText()}`)} />
          )}
        </BesideText>
      </div>
      <InsertDialogs
        picking={picking}
        pictures={pictures}
        traverses={traverses}
        onClose={() => setPicking(null)}
        onPicture={(picture) => {
          if (editor) putInPicture(editor, picture);
          setPicking(null);
        }}
        onChart={(traverse) => {
          if (editor) putInChart(editor, traverse);
          setPicking(null);
        }}
      />
    </FindingsProvider>
  );
}
