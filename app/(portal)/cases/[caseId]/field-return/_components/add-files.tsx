"use client";

import { useRouter } from "next/navigation";
import { DropZone } from "@/components/uploads/drop-zone";

/** Adds photographs and papers to a field return that was sent. */
export function AddFiles({
  caseId,
  disabledReason,
}: {
  caseId: string;
  disabledReason: string | null;
}) {
  const router = useRouter();
  return (
    <DropZone
      caseId={caseId}
      purpose="request_file"
      disabledReason={disabledReason}
      onDone={() => router.refresh()}
    />
  );
}
