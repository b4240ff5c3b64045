"use client";

import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { flushSync } from "react-dom";
import { type Content, EditorContent, useEditor } from "@tiptap/react";
import type { Chart } from "@/lib/charts/primitives";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { classNames } from "@/components/ui/class-names";
import { CHART_FIGURE, CITED_VALUE, type DocumentNode, FIGURE } from "@/lib/findings/document";
import { ROOT_CAUSE_MAX } from "@/lib/findings/document-schema";
import { routes } from "@/lib/routes";
import { keptDraft, type KeptDraft, useDraftSaving } from "@/components/forms/use-draft-saving";
import { CitePanel, type CitableValue } from "./cite-panel";
import { ConflictView } from "./conflict-view";
import { TEXT_EXTENSIONS } from "@/lib/findings/extensions";
import { type CitedLook, FindingsProvider } from "./findings-context";
import { SHOWN_PARTS } from "./part-views";
import { PickDialog } from "./pick-dialog";
import { SavingLine } from "@/components/forms/saving-line";
import { StalePanel } from "./stale-panel";
import { WithdrawnPanel } from "./withdrawn-panel";
import { Toolbar } from "./toolbar";
import type { Draft } from "./draft";
import { EditorNotices, KeptNotice } from "./editor-notices";
import { flaggedPhrases } from "./flagged-phrases";
import { FlaggedPanel } from "./flagged-panel";
import { KeepSections } from "./keep-sections";
import { unsettledValues } from "./unsettled-values";

type CitedState = CitedLook & { recordId: string; versionId: string; field: string };

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
  pictures: { id: string; label: string; caption: string }[];
  traverses: { id: string; label: string; name: string; chart: Chart }[];
  isSigned: boolean;
  refusal: string | null;
};

type SavedFindings = { revision: number; savedAt: string; cited: CitedState[] };

const CURRENT: CitedLook = { state: "current", now: null };
const keyOf = (recordId: string, versionId: string, field: string) =>
  `${recordId}/${versionId}/${field}`;

/** The findings as a sheet of paper, with what can be cited beside it. */
export function FindingsEditor(props: FindingsEditorProps) {
  const { caseId, citable, pictures, traverses, refusal } = props;
  const isReadOnly = refusal !== null;
  const storageKey = `riverline.findings.${caseId}.${props.issueNumber}`;
  const search = useRef<HTMLInputElement>(null);
  const [cited, setCited] = useState(props.cited);
  const [picking, setPicking] = useState<"picture" | "chart" | null>(null);
  const [rootCause, setRootCause] = useState(props.rootCause);
  const [kept, setKept] = useState<KeptDraft<Draft> | null>(null);
  // Counts changes since the last saved state; what stands beside the text follows it.
  const [changes, setChanges] = useState(0);
  const [isRailOpen, setRailOpen] = useState(false);
  const draft = useRef<Draft>({ document: props.document, rootCause: props.rootCause });

  const read = useCallback(() => draft.current, []);
  const saving = useDraftSaving<Draft, SavedFindings>({
    url: routes.api.findings(caseId),
    storageKey,
    revision: props.revision,
    savedAt: props.savedAt,
    read,
    onSaved: useCallback((saved: SavedFindings) => {
      setCited(saved.cited);
      setChanges(0);
    }, []),
  });
  const { changed, saveNow, state } = saving;
  const openSearch = () => {
    // On a narrow screen the list is closed until it is asked for, and a closed one takes no focus.
    flushSync(() => setRailOpen(true));
    search.current?.focus();
  };

  const editor = useEditor({
    immediatelyRender: false,
    editable: !isReadOnly,
    extensions: [...TEXT_EXTENSIONS, ...SHOWN_PARTS, KeepSections],
    content: props.document as Content,
    editorProps: {
      attributes: {
        "aria-label": "Findings",
        class: "findings-text raw outline-none",
        role: "textbox",
        "aria-multiline": "true",
      },
      handleKeyDown: (_view, event) => {
        if (event.key !== "@" || isReadOnly) return false;
        event.preventDefault();
        openSearch();
        return true;
      },
    },
    onUpdate: ({ editor: e }) => {
      draft.current = { ...draft.current, document: e.getJSON() };
      setChanges((n) => n + 1);
      changed();
    },
  });

  useEffect(() => {
    if (isReadOnly) return;
    const copy = keptDraft<Draft>(storageKey, "document");
    // Read once after the page is there: the server cannot know what this device keeps.
    if (copy) queueMicrotask(() => setKept(copy));
  }, [storageKey, isReadOnly]);

  const looks = useMemo(
    () =>
      new Map(cited.map((state) => [keyOf(state.recordId, state.versionId, state.field), state])),
    [cited],
  );
  const sources = useMemo(
    () => ({
      citedLook: (recordId: string, versionId: string, field: string) =>
        looks.get(keyOf(recordId, versionId, field)) ?? CURRENT,
      picture: (imageId: string) => pictures.find((picture) => picture.id === imageId) ?? null,
      chart: (traverseId: string) =>
        traverses.find((traverse) => traverse.id === traverseId) ?? null,
    }),
    [looks, pictures, traverses],
  );

  const { stale, withdrawn } = editor
    ? unsettledValues(editor, sources.citedLook, citable)
    : { stale: [], withdrawn: [] };

  const setCitation = (position: number, attributes: Record<string, unknown>) =>
    editor
      ?.chain()
      .command(({ tr }) => {
        const node = tr.doc.nodeAt(position);
        if (!node) return false;
        tr.setNodeMarkup(position, undefined, { ...node.attrs, ...attributes });
        return true;
      })
      .run();
  const show = (position: number) =>
    editor?.chain().setNodeSelection(position).focus().scrollIntoView().run();

  function cite(value: CitableValue) {
    const { recordId, versionId, field, text, tag } = value;
    // At once, so that what is typed next lands in the text and not in the search.
    editor?.view.focus();
    editor
      ?.chain()
      .focus()
      .insertContent([
        { type: CITED_VALUE, attrs: { recordId, versionId, field, text, tag } },
        { type: "text", text: " " },
      ])
      .run();
    setRailOpen(false);
  }

  function leaveSearch(written?: string) {
    setRailOpen(false);
    editor?.view.focus();
    if (written) editor?.commands.insertContent(written);
  }

  function replaceText(next: Draft) {
    const { document, rootCause: cause } = next;
    draft.current = { document, rootCause: cause };
    setRootCause(cause);
    editor?.commands.setContent(document as Content, { emitUpdate: false });
    setChanges((n) => n + 1);
  }

  return (
    <FindingsProvider value={sources}>
      <div
        className="grid min-h-full xl:grid-cols-[minmax(0,1fr)_20rem]"
        onKeyDown={(event) => {
          if ((event.ctrlKey || event.metaKey) && event.key === "s") {
            event.preventDefault();
            // After a refusal or a lost sign-in nothing waits to be sent until it is touched again.
            if (state.kind === "signed-out" || state.kind === "refused") changed();
            saveNow();
          }
          if (event.altKey && event.key === "ArrowDown" && stale[0]) {
            event.preventDefault();
            const from = editor?.state.selection.from ?? 0;
            show((stale.find((value) => value.position > from) ?? stale[0]).position);
          }
        }}
      >
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
            <div className="flex flex-wrap items-center justify-between gap-3">
              <h1 className="text-16 font-head">
                Findings{" "}
                <span className="text-13 font-normal text-ink-2">issue {props.issueNumber}</span>
              </h1>
              <span className="flex items-center gap-3">
                <SavingLine state={state} />
                <Button
                  small
                  className="xl:hidden"
                  aria-expanded={isRailOpen}
                  onClick={() => setRailOpen(!isRailOpen)}
                >
                  {stale.length + withdrawn.length > 0
                    ? `Values, ${stale.length + withdrawn.length} to settle`
                    : "Values"}
                </Button>
                {props.isSigned ? (
                  <LinkButton small href={routes.signOff(caseId)}>
                    Signed report
                  </LinkButton>
                ) : (
                  <LinkButton
                    small
                    href={routes.api.draftPdf(caseId)}
                    prefetch={false}
                    target="_blank"
                  >
                    Print the draft
                  </LinkButton>
                )}
              </span>
            </div>
            <EditorNotices
              refusal={refusal}
              state={state}
              changes={changes}
              signInHref={routes.signIn(routes.findings(caseId))}
              onTryAgain={changed}
            />
            {kept && (
              <KeptNotice
                kept={kept}
                isSameRevision={kept.revision === props.revision}
                onForget={() => {
                  localStorage.removeItem(storageKey);
                  setKept(null);
                }}
                onPutBack={() => {
                  replaceText(kept);
                  setKept(null);
                  // Goes on from what it was written on: what was saved since then shows beside it.
                  saving.yieldTo(kept.revision);
                  changed();
                }}
              />
            )}
          </div>
          {state.kind === "conflict" && (
            <ConflictView
              conflict={state.conflict}
              onKeepMine={() => saving.overrule(state.conflict.theirs.revision)}
              onTakeTheirs={() => {
                replaceText(state.conflict.theirs);
                saving.yieldTo(state.conflict.theirs.revision);
              }}
            />
          )}
          <div className="mx-auto my-4 max-w-sheet bg-paper px-6 py-10 text-paper-ink sm:px-18">
            <p className="flex justify-between border-b border-paper-rule pb-2 text-12 text-paper-ink-2">
              <span className="font-mono">{props.caseNumber}</span>
              <span>
                Findings, issue {props.issueNumber}, {props.isSigned ? "signed" : "not signed"}
              </span>
            </p>
            <label className="mt-6 block text-13 font-head" htmlFor="root-cause">
              Root cause, in one sentence
            </label>
            <textarea
              id="root-cause"
              rows={2}
              maxLength={ROOT_CAUSE_MAX}
              readOnly={isReadOnly}
              className="raw mt-1 w-full resize-y border-l-3 border-action bg-transparent pl-4 font-serif text-sheet"
              placeholder="What failed, by which mechanism, from where, and why."
              value={rootCause}
              onChange={(event) => {
                setRootCause(event.target.value);
                draft.current = { ...draft.current, rootCause: event.target.value };
                changed();
              }}
            />
            <EditorContent editor={editor} />
          </div>
        </div>
        <aside
          aria-label="Beside the text"
          className={classNames(
            "overflow-y-auto border-l border-rule-2 bg-surface xl:sticky xl:top-[6.5rem] xl:max-h-[calc(100dvh-6.5rem)]",
            isRailOpen
              ? "max-xl:fixed max-xl:top-[6.5rem] max-xl:right-0 max-xl:bottom-0 max-xl:z-20 max-xl:w-80 max-xl:shadow-lift-2"
              : "max-xl:hidden",
          )}
        >
          <p className="flex justify-end p-2 xl:hidden">
            <Button small look="quiet" onClick={() => setRailOpen(false)}>
              Close
            </Button>
          </p>
          <StalePanel
            stale={stale}
            isReadOnly={isReadOnly}
            onShow={show}
            onTake={(values) => {
              for (const { position, now } of values)
                setCitation(position, {
                  versionId: now.versionId,
                  text: now.text,
                  keptReason: null,
                });
            }}
            onKeep={(value, keptReason) => setCitation(value.position, { keptReason })}
          />
          <WithdrawnPanel
            withdrawn={withdrawn}
            isReadOnly={isReadOnly}
            onShow={show}
            onTakeOut={(position) =>
              editor
                ?.chain()
                .deleteRange({ from: position, to: position + 1 })
                .run()
            }
          />
          <CitePanel
            values={citable}
            search={search}
            isReadOnly={isReadOnly}
            onCite={cite}
            onLeave={leaveSearch}
          />
          {editor && <FlaggedPanel phrases={flaggedPhrases(`${rootCause}\n${editor.getText()}`)} />}
        </aside>
      </div>
      <PickDialog
        title="Put in a picture"
        none="No picture of this case is ready yet."
        choices={pictures.map(({ id, label, caption }) => ({
          id,
          label,
          words: caption,
          picture: routes.api.thumbnail(id),
        }))}
        isOpen={picking === "picture"}
        onOpenChange={(open) => setPicking(open ? "picture" : null)}
        onPick={(imageId) => {
          const caption = pictures.find((picture) => picture.id === imageId)?.caption ?? "";
          editor
            ?.chain()
            .focus()
            .insertContent({ type: FIGURE, attrs: { imageId, caption, withMarks: true } })
            .run();
          setPicking(null);
        }}
      />
      <PickDialog
        title="Put in a chart"
        none="No traverse is recorded yet."
        choices={traverses.map(({ id, label, name }) => ({ id, label, words: name }))}
        isOpen={picking === "chart"}
        onOpenChange={(open) => setPicking(open ? "chart" : null)}
        onPick={(traverseId) => {
          const traverse = traverses.find((known) => known.id === traverseId);
          editor
            ?.chain()
            .focus()
            .insertContent({
              type: CHART_FIGURE,
              attrs: {
                traverseId,
                caption: `Hardness against depth, ${traverse?.label ?? ""} ${traverse?.name ?? ""}. Bars are expanded uncertainty, k = 2.`,
              },
            })
            .run();
          setPicking(null);
        }}
      />
    </FindingsProvider>
  );
}
