"use client";

import { useState } from "react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextAreaField, TextField } from "@/components/ui/labelled-fields";
import { Notice } from "@/components/ui/notice";
import type { ItemChoice } from "@/components/uploads/picture-details";
import { TECHNIQUE_NAMES, TECHNIQUES } from "@/lib/images/constants";
import type { PictureRow } from "@/lib/images/list-pictures";
import { oneNumber } from "@/lib/intake/one-number";
import { describe } from "../actions";

type Props = { picture: PictureRow; items: readonly ItemChoice[] };

/** Changes what is said of a picture; the picture itself never changes. */
export function DescribeDialog({ picture, items }: Props) {
  const { id, label, version, content } = picture;
  const form = useActionForm<{ version: number }>();
  const [isOpen, setOpen] = useState(false);
  const [numberProblem, setNumberProblem] = useState<string | null>(null);
  const formId = `describe-${id}`;
  const field = (name: string) => `${formId}-${name}`;
  const error = (name: string) => form.fields[`content.${name}`];

  function send(data: FormData) {
    const text = (name: string) => String(data.get(name) ?? "").trim();
    const typed = text("magnification").replace(/^×\s*/, "");
    const magnification = typed === "" ? null : oneNumber(typed, "");
    setNumberProblem(magnification && !magnification.ok ? magnification.says : null);
    if (magnification && !magnification.ok) return;
    form.send(
      () =>
        describe({
          imageId: id,
          seenVersion: version,
          isShareable: data.get("isShareable") !== null,
          content: {
            caption: text("caption"),
            technique: TECHNIQUES.find((known) => known === text("technique")) ?? "other",
            itemId: text("itemId") || null,
            face: text("face"),
            magnification: magnification?.value ?? null,
            takenOn: text("takenOn") || null,
          },
        }),
      () => setOpen(false),
    );
  }
  return (
    <Dialog
      open={isOpen}
      onOpenChange={setOpen}
      width="form"
      keepOpenOutside
      title={`Describe ${label}`}
      trigger={
        <Button small aria-label={`Describe ${label}`}>
          Describe
        </Button>
      }
      footer={
        <>
          <Button onClick={() => setOpen(false)}>Not now</Button>
          <Button type="submit" form={formId} look="primary" disabled={form.isBusy}>
            Keep the description
          </Button>
        </>
      }
    >
      <form
        id={formId}
        className="grid gap-3 sm:grid-cols-2"
        onSubmit={(event) => {
          event.preventDefault();
          send(new FormData(event.currentTarget));
        }}
      >
        {form.failure && (
          <div className="sm:col-span-2">
            <Notice kind="bad" title="The description was not saved." live="assertive">
              {form.failure}
            </Notice>
          </div>
        )}
        <TextAreaField
          id={field("caption")}
          name="caption"
          label="Caption"
          rows={2}
          maxLength={300}
          optional
          defaultValue={content.caption}
          fieldClassName="sm:col-span-2"
          error={error("caption")}
        />
        <SelectField
          id={field("technique")}
          name="technique"
          label="Taken with"
          defaultValue={content.technique}
          options={TECHNIQUES.map((known) => ({ value: known, label: TECHNIQUE_NAMES[known] }))}
          error={error("technique")}
        />
        <TextField
          id={field("magnification")}
          name="magnification"
          label="Recorded magnification"
          hint="It says nothing about scale."
          inputMode="decimal"
          optional
          defaultValue={content.magnification ?? ""}
          error={numberProblem ?? error("magnification")}
        />
        <SelectField
          id={field("itemId")}
          name="itemId"
          label="Shows"
          defaultValue={content.itemId ?? ""}
          options={[
            { value: "", label: "No item, or several" },
            ...items.map((item) => ({ value: item.id, label: item.label })),
          ]}
          error={error("itemId")}
        />
        <TextField
          id={field("face")}
          name="face"
          label="Face or side"
          optional
          maxLength={120}
          defaultValue={content.face}
          error={error("face")}
        />
        <TextField
          id={field("takenOn")}
          name="takenOn"
          type="date"
          label="Taken on"
          optional
          defaultValue={content.takenOn ?? ""}
          error={error("takenOn")}
        />
        <div className="sm:col-span-2">
          <Checkbox
            name="isShareable"
            label="The requester may see it before the report"
            defaultChecked={picture.isShareable}
          />
        </div>
      </form>
    </Dialog>
  );
}
