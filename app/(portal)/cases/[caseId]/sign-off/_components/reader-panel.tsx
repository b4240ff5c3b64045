"use client";

import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { SelectField, TextAreaField } from "@/components/ui/labelled-fields";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { RadioGroup } from "@/components/ui/radio-group";
import { formatDateTime } from "@/lib/format/dates";
import type { SignOffPage } from "@/lib/reports/read-sign-off";
import { routes } from "@/lib/routes";
import { saveReading, sendToReader } from "../actions";

/** Who reads the findings as second reader, and what came of it. */
export function ReaderPanel({ page }: { page: SignOffPage }) {
  const { acts, reading, issue } = page;
  return (
    <Panel>
      <PanelHead title="Second reader" note={page.secondReader?.name ?? "Nobody named"} />
      <PanelBody>
        <div className="grid gap-3">
          {reading && (
            <Notice
              kind={reading.verdict === "read" && reading.isOfThisText ? "met" : "warn"}
              title={reading.verdict === "read" ? "Read" : "Sent back"}
            >
              {reading.by}, {formatDateTime(reading.at)}.{" "}
              {reading.verdict === "read" &&
                !reading.isOfThisText &&
                "The findings changed afterwards and have to be read again. "}
              <span className="raw">{reading.note}</span>
            </Notice>
          )}
          {acts.sendToSecondReader.isOpen && <ChooseReader page={page} />}
          {acts.recordReading.isOpen && issue && (
            <ReadingForm caseId={page.caseId} revision={issue.revision} />
          )}
          {!reading && !acts.sendToSecondReader.isOpen && !acts.recordReading.isOpen && (
            <p className="text-13 text-ink-2">{acts.recordReading.reason}</p>
          )}
        </div>
      </PanelBody>
    </Panel>
  );
}

function ChooseReader({ page }: { page: SignOffPage }) {
  const form = useActionForm<void>();
  return (
    <form
      className="grid max-w-98 gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const readerId = String(new FormData(event.currentTarget).get("readerId") ?? "");
        form.send(
          () => sendToReader({ caseId: page.caseId, readerId }),
          () => undefined,
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="Not sent" live="assertive">
          {form.failure}
        </Notice>
      )}
      <SelectField
        name="readerId"
        label="Who reads it"
        placeholder="Choose a person"
        defaultValue={page.secondReader?.id ?? ""}
        options={page.readers.map(({ id, name }) => ({ value: id, label: name }))}
        error={form.fields.readerId}
        hint="Neither an author nor the person who signs."
      />
      <p>
        <Button
          type="submit"
          look="primary"
          disabled={form.isBusy}
          disabledReason={page.issue?.hasText ? null : "Write the findings first."}
        >
          Send to the second reader
        </Button>
      </p>
    </form>
  );
}

function ReadingForm({ caseId, revision }: { caseId: string; revision: number }) {
  const form = useActionForm<{ label: string }>();
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const verdict = data.get("verdict") === "read" ? "read" : "sent_back";
        form.send(
          () => saveReading({ caseId, revision, verdict, note: String(data.get("note") ?? "") }),
          () => undefined,
        );
      }}
    >
      {form.failure && (
        <Notice kind="bad" title="The reading was not recorded" live="assertive">
          {form.failure}
        </Notice>
      )}
      <p className="flex flex-wrap items-center justify-between gap-2 text-13 text-ink-2">
        Read the text and leave notes beside it; the author answers each before it is signed.
        <LinkButton small href={routes.findings(caseId)}>
          Read the findings
        </LinkButton>
      </p>
      <RadioGroup
        name="verdict"
        label="Your reading"
        defaultValue="read"
        options={[
          { value: "read", label: "Read; data, calculations and reasoning hold" },
          { value: "sent_back", label: "Send back to be changed" },
        ]}
      />
      <TextAreaField
        name="note"
        label="Note"
        optional
        rows={3}
        maxLength={4000}
        error={form.fields.note}
      />
      <p>
        <Button type="submit" look="primary" disabled={form.isBusy}>
          Record the reading
        </Button>
      </p>
    </form>
  );
}
