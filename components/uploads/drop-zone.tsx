"use client";

import { useState } from "react";
import { useDropzone } from "react-dropzone";
import { Button } from "@/components/ui/button";
import { classNames } from "@/components/ui/class-names";
import { Notice } from "@/components/ui/notice";
import type { UploadPurpose } from "@/lib/uploads/constants";
import { acceptMap, FILE_RULES } from "@/lib/uploads/file-rules";
import type { UploadDetails } from "@/lib/uploads/schemas";
import { FileRowView } from "./file-row-view";
import { spokenState } from "./file-row-words";
import { type ItemChoice, PictureDetails } from "./picture-details";
import { useLeaveWarning } from "./use-leave-warning";
import { useUploads } from "./use-uploads";

export type DropZoneProps = {
  caseId: string;
  purpose: UploadPurpose;
  /** Items that a picture can show; for pictures only. */
  items?: readonly ItemChoice[];
  /** Why no file can be added now; null when it can. */
  disabledReason?: string | null;
  /** Called each time a file has been checked and taken in. */
  onDone?: () => void;
};

const NO_ITEMS: readonly ItemChoice[] = [];
const megabytes = (bytes: number) => Math.floor(bytes / 1024 / 1024);

/** Takes files by drop, paste of the keyboard or choice, and shows each until it is taken in. */
export function DropZone({
  caseId,
  purpose,
  items = NO_ITEMS,
  disabledReason = null,
  onDone,
}: DropZoneProps) {
  const isPicture = purpose === "image";
  const [details, setDetails] = useState<UploadDetails>(isPicture ? { technique: "camera" } : {});
  const uploads = useUploads(caseId, purpose, onDone);
  useLeaveWarning(uploads.isSending);
  const rule = FILE_RULES[purpose];
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    accept: acceptMap(purpose),
    disabled: disabledReason !== null,
    noClick: true,
    noKeyboard: true,
    // What does not fit is shown with its reason, file by file, instead of falling away.
    onDrop: (accepted, rejections) =>
      uploads.add([...accepted, ...rejections.map(({ file }) => file)], details),
  });
  const last = uploads.rows.at(-1);
  return (
    <div className="grid gap-3">
      {disabledReason !== null ? (
        <Notice kind="readonly" title="No files can be added.">
          {disabledReason}
        </Notice>
      ) : (
        <div
          {...getRootProps({
            className: classNames(
              "grid gap-3 rounded-4 border border-dashed p-4",
              isDragActive ? "border-action bg-action-tint" : "border-control bg-surface-2",
            ),
          })}
        >
          <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
            <Button look="primary" onClick={open}>
              {isPicture ? "Choose pictures" : "Choose files"}
            </Button>
            <p className="text-12 text-ink-2">
              or drop them here. {rule.says}, up to {megabytes(rule.maxBytes)} MB each
              {isPicture ? " and 400 megapixels; 8 or 16 bit" : ""}. The original is kept unchanged.
            </p>
          </div>
          {isPicture && <PictureDetails details={details} items={items} onChange={setDetails} />}
          <input
            {...getInputProps({ "aria-label": isPicture ? "Pictures to add" : "Files to add" })}
          />
        </div>
      )}
      {uploads.rows.length > 0 && (
        <ul aria-label="Files on their way" className="rounded-4 border border-rule bg-surface">
          {uploads.rows.map((row) => (
            <FileRowView
              key={row.key}
              row={row}
              caseId={caseId}
              acts={{ ...uploads, choose: open }}
            />
          ))}
        </ul>
      )}
      <p role="status" className="sr-only">
        {last ? spokenState(last) : ""}
      </p>
    </div>
  );
}
