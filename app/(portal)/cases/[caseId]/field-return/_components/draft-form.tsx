"use client";

import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { useRouter } from "next/navigation";
import { keptDraft, type KeptDraft, useDraftSaving } from "@/components/forms/use-draft-saving";
import { SavingLine } from "@/components/forms/saving-line";
import { useActionForm } from "@/components/forms/use-action-form";
import { MAIN_ID } from "@/components/frame/skip-link";
import { FieldRow } from "@/components/intake/field-row";
import { SectionSpine } from "@/components/intake/section-spine";
import { DropZone } from "@/components/uploads/drop-zone";
import { Button } from "@/components/ui/button";
import { Kbd } from "@/components/ui/kbd";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { WorkedOut } from "@/components/ui/worked-out";
import { formatTime } from "@/lib/format/dates";
import type { Answer, Answers } from "@/lib/intake/answers";
import { checkAnswer, checkForSending, type Problems } from "@/lib/intake/check-answers";
import { fieldByKey, type FieldKey, FIELDS, isFieldKey, SECTIONS } from "@/lib/intake/fields";
import { limitHardness } from "@/lib/intake/limit-hardness";
import { packingAdvice } from "@/lib/intake/packing-advice";
import type { FieldReturnPage } from "@/lib/intake/read-field-return";
import { routes } from "@/lib/routes";
import { sendFieldReturn } from "../actions";
import { ConflictNotice } from "./conflict-notice";
import { EarlierReturns } from "./earlier-returns";
import { ProblemList } from "./problem-list";

type Draft = { answers: Answers };

/** A field return being filled in: sections in the middle, progress at the left, help at the right. */
export function DraftForm({ page }: { page: FieldReturnPage }) {
  const router = useRouter();
  const storageKey = `riverline.field-return.${page.caseId}`;
  const [answers, setAnswers] = useState(page.answers);
  const [shown, setShown] = useState<Problems>({});
  const [kept, setKept] = useState<KeptDraft<Draft> | null>(null);
  const draft = useRef<Draft>({ answers: page.answers });
  const revision = useRef(page.revision);
  const form = useActionForm<{ number: string }>();
  const problems = useRef<HTMLDivElement>(null);
  const saving = useDraftSaving<Draft, { revision: number; savedAt: string }>({
    url: routes.api.fieldReturnDraft(page.caseId),
    storageKey,
    revision: page.revision,
    savedAt: page.savedAt,
    read: useCallback(() => draft.current, []),
    onSaved: useCallback((saved: { revision: number }) => {
      revision.current = saved.revision;
    }, []),
  });
  const { changed, state } = saving;

  useEffect(() => {
    const copy = keptDraft<Draft>(storageKey, "answers");
    if (copy) queueMicrotask(() => setKept(copy));
  }, [storageKey]);

  const take = useCallback((next: Answers) => {
    draft.current = { answers: next };
    setAnswers(next);
  }, []);

  const onAnswer = useCallback(
    (key: FieldKey, answer: Answer) => {
      take({ ...draft.current.answers, [key]: answer });
      setShown((now) =>
        now[key]
          ? {
              ...now,
              [key]:
                checkAnswer(fieldByKey(key), { ...draft.current.answers, [key]: answer }) ??
                undefined,
            }
          : now,
      );
      changed();
    },
    [changed, take],
  );
  const onLeave = useCallback((key: FieldKey) => {
    setShown((now) => ({
      ...now,
      [key]: checkAnswer(fieldByKey(key), draft.current.answers) ?? undefined,
    }));
  }, []);

  function send() {
    const found = checkForSending(draft.current.answers, new Date());
    setShown(found);
    if (Object.keys(found).length > 0) {
      requestAnimationFrame(() => problems.current?.focus());
      return;
    }
    if (state.kind !== "saved") {
      saving.saveNow();
      return;
    }
    form.send(
      () => sendFieldReturn({ caseId: page.caseId, revision: revision.current }),
      () => {
        localStorage.removeItem(storageKey);
        router.push(routes.case(page.caseId));
        router.refresh();
      },
    );
  }

  function toNextSection() {
    const at = SECTIONS.findIndex((section) =>
      document.getElementById(`section-${section.key}`)?.contains(document.activeElement),
    );
    const next = SECTIONS[(at + 1) % SECTIONS.length];
    document.getElementById(`section-${next?.key}`)?.focus();
  }

  const listed = {
    ...shown,
    ...Object.fromEntries(Object.entries(form.fields).filter(([key]) => isFieldKey(key))),
  };
  const limit = useMemo(() => limitHardness(answers), [answers]);
  const waits = state.kind !== "saved" ? "Saving first; send again in a moment." : null;
  return (
    <div
      onKeyDown={(event) => {
        if ((event.ctrlKey || event.metaKey) && event.key === "Enter") {
          event.preventDefault();
          send();
        }
        if (event.altKey && event.key === "ArrowDown") {
          event.preventDefault();
          toNextSection();
        }
      }}
    >
      <div className="sticky top-topbar z-20 flex min-h-casebar flex-wrap items-center gap-3.5 border-b border-rule-2 bg-surface px-4 py-2">
        <h1 className="text-16 font-head">New field return</h1>
        <span className="text-13 text-ink-3">{page.client}</span>
        <span className="ml-auto flex flex-wrap items-center gap-3">
          <SavingLine state={state} />
          <LinkButton href={routes.cases()}>Close, keep draft</LinkButton>
          <Button look="primary" disabled={form.isBusy} onClick={send}>
            {form.isBusy ? "Sending" : "Send to the laboratory"}
          </Button>
        </span>
      </div>
      <div className="flex">
        <SectionSpine answers={answers} problems={listed} />
        <main id={MAIN_ID} tabIndex={-1} className="grid min-w-0 flex-1 gap-3.5 p-4 lg:px-7">
          {kept && (
            <Notice
              kind="warn"
              title={`Answers kept on this device from ${formatTime(kept.at)} were never saved`}
              actions={
                <>
                  <Button
                    small
                    onClick={() => {
                      localStorage.removeItem(storageKey);
                      setKept(null);
                    }}
                  >
                    Forget them
                  </Button>
                  <Button
                    small
                    look="primary"
                    onClick={() => {
                      take(kept.answers);
                      setKept(null);
                      changed();
                    }}
                  >
                    Put them back
                  </Button>
                </>
              }
            />
          )}
          {state.kind === "conflict" && (
            <ConflictNotice
              conflict={state.conflict}
              onKeepMine={() => saving.overrule(state.conflict.theirs.revision)}
              onTakeTheirs={() => {
                take(state.conflict.theirs.answers);
                revision.current = state.conflict.theirs.revision;
                saving.yieldTo(state.conflict.theirs.revision);
              }}
            />
          )}
          {state.kind === "signed-out" && (
            <Notice
              kind="bad"
              title="You are signed out"
              live="assertive"
              actions={
                <LinkButton
                  small
                  href={routes.signIn(routes.fieldReturn(page.caseId))}
                  target="_blank"
                >
                  Sign in in a new window
                </LinkButton>
              }
            >
              What you typed is kept on this page and on this device.
            </Notice>
          )}
          {state.kind === "refused" && (
            <Notice kind="bad" title="The field return was not saved" live="assertive">
              {state.message}
            </Notice>
          )}
          {form.failure && (
            <Notice kind="bad" title="Nothing was sent" live="assertive">
              {form.failure}
            </Notice>
          )}
          {SECTIONS.map((section, i) => (
            <section
              key={section.key}
              id={`section-${section.key}`}
              tabIndex={-1}
              aria-labelledby={`head-${section.key}`}
              className="scroll-mt-28 rounded-4 border border-rule-2 bg-surface"
            >
              <header className="flex min-h-10 flex-wrap items-center gap-2.5 border-b border-rule px-4.5 py-2">
                <span className="font-mono text-12 text-ink-3">{i + 1}</span>
                <h2 id={`head-${section.key}`} className="text-14 font-head">
                  {section.title}
                </h2>
                <span className="ml-auto text-13 text-ink-3">{section.note}</span>
              </header>
              <div className="grid gap-4 p-4.5">
                {section.groups.map((group, g) => (
                  <div key={group.title ?? g} className="grid gap-x-5 gap-y-4 lg:grid-cols-12">
                    {group.title && (
                      <h3 className="text-13 font-head lg:col-span-12">{group.title}</h3>
                    )}
                    {group.fields.map((field) => (
                      <FieldRow
                        key={field.key}
                        field={field}
                        answer={answers[field.key]}
                        problem={listed[field.key] ?? null}
                        onAnswer={onAnswer}
                        onLeave={onLeave}
                      />
                    ))}
                    {section.key === "material" && g === 0 && limit && (
                      <div className="lg:col-span-4">
                        <WorkedOut
                          label="Limit hardness"
                          value={limit.limitHv === null ? null : String(limit.limitHv)}
                          unit={limit.scale}
                          rule={limit.rule}
                        />
                      </div>
                    )}
                  </div>
                ))}
                {section.key === "event" && <EarlierReturns earlier={page.earlier} />}
                {section.key === "sent" && (
                  <div>
                    <h3 className="mb-2 text-13 font-head">Photographs and papers</h3>
                    <DropZone
                      caseId={page.caseId}
                      purpose="request_file"
                      disabledReason={page.mayAddFiles}
                      onDone={() => router.refresh()}
                    />
                    <ul className="mt-2 text-13">
                      {page.files.map((file) => (
                        <li key={file.id}>{file.fileName}</li>
                      ))}
                    </ul>
                  </div>
                )}
              </div>
            </section>
          ))}
        </main>
        <aside
          aria-label="Help"
          className="hidden w-76 shrink-0 border-l border-rule-2 bg-surface-2 p-5 xl:block"
        >
          <div className="sticky top-32 grid max-h-[calc(100dvh-9rem)] gap-5 overflow-y-auto text-13">
            <div ref={problems} tabIndex={-1}>
              <ProblemList problems={listed} fields={FIELDS} />
            </div>
            {waits && <p className="text-12 text-ink-3">{waits}</p>}
            <div className="grid gap-1.5">
              <h2 className="font-head">What happens next</h2>
              <p className="text-ink-2">1. You get a case number and write it on the box.</p>
              <p className="text-ink-2">
                2. The laboratory accepts the parts and tells you the date.
              </p>
              <p className="text-ink-2">3. You can add photographs until the report is signed.</p>
            </div>
            <div className="grid gap-1.5">
              <h2 className="font-head">Before you pack</h2>
              {packingAdvice(answers).map((advice) => (
                <p key={advice} className="text-ink-2">
                  {advice}
                </p>
              ))}
            </div>
            <p className="border-t border-rule pt-3 text-12 text-ink-3">
              Every question takes a value, or why there is none. <Kbd>Ctrl</Kbd> <Kbd>Enter</Kbd>{" "}
              sends, <Kbd>Alt</Kbd> <Kbd>↓</Kbd> goes to the next section.
            </p>
          </div>
        </aside>
      </div>
    </div>
  );
}
