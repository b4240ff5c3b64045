"use client";

import { useRef } from "react";
import { useRouter } from "next/navigation";
import { AsideNotices } from "@/components/forms/aside-notices";
import { DraftNotices } from "@/components/forms/draft-notices";
import { SavingLine } from "@/components/forms/saving-line";
import { useActionForm } from "@/components/forms/use-action-form";
import { MAIN_ID } from "@/components/frame/skip-link";
import { SectionSpine } from "@/components/intake/section-spine";
import { DropZone } from "@/components/uploads/drop-zone";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { FIELDS, isFieldKey, SECTIONS } from "@/lib/intake/fields";
import type { FieldReturnPage } from "@/lib/intake/read-field-return";
import { routes } from "@/lib/routes";
import { sendFieldReturn } from "../actions";
import { ConflictNotice } from "./conflict-notice";
import { EarlierReturns } from "./earlier-returns";
import { FormSection } from "./form-section";
import { HelpPanel } from "./help-panel";
import { ProblemList } from "./problem-list";
import { useAnswers } from "./use-answers";

const NOT_SAVED =
  "The answers are not saved yet, so nothing was sent. They are kept; see above, and send again.";

/** A field return being filled in: sections in the middle, progress at the left, help at the right. */
export function DraftForm({ page }: { page: FieldReturnPage }) {
  const router = useRouter();
  const draft = useAnswers(page);
  const { answers, saving } = draft;
  const { state } = saving;
  const form = useActionForm<{ number: string }>();
  // Beside the form where there is room, above it elsewhere; the other one is not shown.
  const listBeside = useRef<HTMLDivElement>(null);
  const listAbove = useRef<HTMLDivElement>(null);

  function send() {
    if (form.isBusy) return;
    if (!draft.checkAll()) {
      requestAnimationFrame(() => {
        listAbove.current?.focus();
        listBeside.current?.focus();
      });
      return;
    }
    form.send(
      async () =>
        (await saving.saveNow())
          ? sendFieldReturn({ caseId: page.caseId, revision: saving.revisionSeen() })
          : { ok: false, error: { message: NOT_SAVED } },
      () => {
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

  function onKeyDown(event: React.KeyboardEvent) {
    if ((event.ctrlKey || event.metaKey) && event.key === "Enter") {
      event.preventDefault();
      send();
    }
    if (event.altKey && event.key === "ArrowDown") {
      event.preventDefault();
      toNextSection();
    }
  }

  const problems = {
    ...draft.problems,
    ...Object.fromEntries(Object.entries(form.fields).filter(([key]) => isFieldKey(key))),
  };
  return (
    <div onKeyDown={onKeyDown}>
      <div className="sticky top-topbar z-20 flex min-h-casebar flex-wrap items-center gap-3.5 border-b border-rule-2 bg-surface px-4 py-2">
        <h1 className="text-16 font-head">New field return</h1>
        <span className="text-13 text-ink-3">{page.client}</span>
        <span className="ml-auto flex flex-wrap items-center gap-3">
          <SavingLine state={state} keepsCopy={saving.keepsCopy} />
          <LinkButton href={routes.cases()}>Close, keep draft</LinkButton>
          <Button look="primary" disabled={form.isBusy} onClick={send}>
            {form.isBusy ? "Sending" : "Send to the laboratory"}
          </Button>
        </span>
      </div>
      <div className="flex">
        <SectionSpine answers={answers} problems={problems} />
        <main id={MAIN_ID} tabIndex={-1} className="grid min-w-0 flex-1 gap-3.5 p-4 lg:px-7">
          <div ref={listAbove} tabIndex={-1} className="scroll-mt-28 empty:hidden xl:hidden">
            <ProblemList problems={problems} fields={FIELDS} />
          </div>
          <AsideNotices
            what="Answers"
            aside={draft.aside}
            revision={saving.revision}
            onForget={draft.forget}
            onPutBack={draft.putBack}
          />
          {state.kind === "conflict" && (
            <ConflictNotice
              conflict={state.conflict}
              onKeepMine={() => saving.overrule(state.conflict.theirs.revision)}
              onTakeTheirs={draft.takeTheirs}
            />
          )}
          <DraftNotices
            notSaved="The field return was not saved."
            state={state}
            keepsCopy={saving.keepsCopy}
            changes={draft.changes}
            signInHref={routes.signIn(routes.fieldReturn(page.caseId))}
            onTryAgain={() => void saving.saveNow()}
          />
          {form.failure && (
            <Notice kind="bad" title="Nothing was sent." live="assertive">
              {form.failure}
            </Notice>
          )}
          {SECTIONS.map((section, i) => (
            <FormSection
              key={section.key}
              section={section}
              number={i + 1}
              answers={answers}
              problems={problems}
              onAnswer={draft.answer}
              onLeave={draft.check}
            >
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
            </FormSection>
          ))}
        </main>
        <aside
          aria-label="Help"
          className="hidden w-76 shrink-0 border-l border-rule-2 bg-surface-2 p-5 xl:block"
        >
          <div className="sticky top-32 grid max-h-[calc(100dvh-9rem)] gap-5 overflow-y-auto text-13">
            <div ref={listBeside} tabIndex={-1}>
              <ProblemList problems={problems} fields={FIELDS} />
            </div>
            <HelpPanel answers={answers} />
          </div>
        </aside>
      </div>
    </div>
  );
}
