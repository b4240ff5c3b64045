"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Dialog } from "@/components/ui/dialog";
import { ErrorText } from "@/components/ui/error-text";
import { SelectField, TextAreaField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import type { CaseOverview } from "@/lib/cases/case-overview";
import { PRIORITIES, PRIORITY_NAMES } from "@/lib/cases/constants";
import type { SeatChoices } from "@/lib/cases/seat-choices";
import { accept, assign } from "../actions";

type Props = {
  caseId: string;
  seats: SeatChoices;
  assignment: CaseOverview["assignment"];
  isAcceptance: boolean;
};

/** Accepts a case, or changes its people, priority and date. */
export function AssignmentDialog({ caseId, seats, assignment, isAcceptance }: Props) {
  const form = useActionForm<void>();
  const [isOpen, setOpen] = useState(false);
  const words = isAcceptance ? "Accept the case" : "Change people or date";
  function send(data: FormData) {
    const text = (name: string) => String(data.get(name) ?? "");
    const priority = PRIORITIES.find((known) => known === text("priority"));
    if (!priority) return;
    const chosen = {
      caseId,
      priority,
      leadId: text("leadId"),
      investigatorId: text("investigatorId"),
      secondReaderId: text("secondReaderId") || null,
      technicianIds: data.getAll("technicianIds").map(String),
      dueOn: text("dueOn"),
    };
    form.send(
      () =>
        isAcceptance
          ? accept({
              ...chosen,
              impartialityStatement: text("impartialityStatement"),
              earlierReturnsSeen: true,
            })
          : assign({ ...chosen, seen: assignment }),
      () => setOpen(false),
    );
  }
  const id = isAcceptance ? "accept-form" : "assign-form";
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title={words}
      trigger={<Button look={isAcceptance ? "primary" : "secondary"}>{words}</Button>}
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form={id} look="primary" disabled={form.isBusy}>
            {isAcceptance ? "Accept the case" : "Save"}
          </Button>
        </>
      }
    >
      <form
        id={id}
        className="grid gap-3 sm:grid-cols-2"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <div className="sm:col-span-2">
            <Notice kind="bad" title="Nothing was saved" live="assertive">
              {form.failure}
            </Notice>
          </div>
        )}
        <SelectField
          name="priority"
          label="Priority"
          defaultValue={assignment.priority ?? "P3"}
          options={PRIORITIES.map((key) => ({ value: key, label: PRIORITY_NAMES[key] }))}
          error={form.fields.priority}
        />
        <TextField
          name="dueOn"
          type="date"
          label="Due"
          required
          defaultValue={assignment.dueOn ?? ""}
          error={form.fields.dueOn}
        />
        <SelectField
          name="investigatorId"
          label="Investigator"
          placeholder="Choose a person"
          defaultValue={assignment.investigatorId ?? ""}
          options={seats.investigator}
          error={form.fields.investigatorId}
        />
        <SelectField
          name="leadId"
          label="Signs"
          placeholder="Choose a person"
          defaultValue={assignment.leadId ?? ""}
          options={seats.lead}
          error={form.fields.leadId}
        />
        <SelectField
          name="secondReaderId"
          label="Second reader"
          defaultValue={assignment.secondReaderId ?? ""}
          options={[{ value: "", label: "Named later" }, ...seats.secondReader]}
          error={form.fields.secondReaderId}
        />
        <fieldset>
          <legend className="mb-1 text-13 font-strong">Technicians</legend>
          {seats.technician.map(({ value, label }) => (
            <Checkbox
              key={value}
              name="technicianIds"
              value={value}
              label={label}
              defaultChecked={assignment.technicianIds.includes(value)}
            />
          ))}
          {form.fields.technicianIds && <ErrorText>{form.fields.technicianIds}</ErrorText>}
        </fieldset>
        {isAcceptance && (
          <>
            <TextAreaField
              name="impartialityStatement"
              label="Impartiality"
              rows={2}
              required
              fieldClassName="sm:col-span-2"
              defaultValue="Nobody named here owns the design, the process or the supplier."
              error={form.fields.impartialityStatement}
            />
            <div className="sm:col-span-2">
              <Checkbox
                name="seen"
                required
                label="I have looked at the earlier returns of this drawing."
              />
            </div>
          </>
        )}
      </form>
    </Dialog>
  );
}
