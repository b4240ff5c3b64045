"use client";

import { useRouter } from "next/navigation";
import { DropZone } from "@/components/uploads/drop-zone";
import type { ItemChoice } from "@/components/uploads/picture-details";

type Props = { caseId: string; items: readonly ItemChoice[]; disabledReason: string | null };

/** Adds pictures; each appears in the list once it has been checked. */
export function AddPictures({ caseId, items, disabledReason }: Props) {
  const router = useRouter();
  return (
    <DropZone
      caseId={caseId}
      purpose="image"
      items={items}
      disabledReason={disabledReason}
      onDone={() => router.refresh()}
    />
  );
}
