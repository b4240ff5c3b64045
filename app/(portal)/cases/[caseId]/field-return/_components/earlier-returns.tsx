import Link from "next/link";
import { Notice } from "@/components/ui/notice";
import type { EarlierReturn } from "@/lib/cases/earlier-returns";
import { formatCount } from "@/lib/format/numbers";
import { routes } from "@/lib/routes";

/** Earlier field returns on the same drawing that this person may see. */
export function EarlierReturns({ earlier }: { earlier: readonly EarlierReturn[] }) {
  if (earlier.length === 0) return null;
  return (
    <Notice kind="warn" title={`${formatCount(earlier.length, "earlier return")} on this drawing`}>
      {earlier.map((found, i) => (
        <span key={found.caseId}>
          {i > 0 && ", "}
          <Link href={routes.case(found.caseId)} className="font-mono">
            {found.number}
          </Link>{" "}
          {found.title}
        </span>
      ))}
    </Notice>
  );
}
