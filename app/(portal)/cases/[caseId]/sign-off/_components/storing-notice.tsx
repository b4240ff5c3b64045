"use client";

import { useEffect } from "react";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { Notice } from "@/components/ui/notice";
import { formatDateTime } from "@/lib/format/dates";

const LOOK_EVERY_MS = 2_000;

type Props = {
  issueNumber: number;
  signedAt: string;
  releasedAt: string | null;
  fingerprint: string;
  reportHref: string;
};

/** Signed; while the PDF is written and checked, the page looks again by itself. */
export function StoringNotice({
  issueNumber,
  signedAt,
  releasedAt,
  fingerprint,
  reportHref,
}: Props) {
  const router = useRouter();
  useEffect(() => {
    if (releasedAt !== null) return;
    const timer = setInterval(() => router.refresh(), LOOK_EVERY_MS);
    return () => clearInterval(timer);
  }, [releasedAt, router]);
  const short = fingerprint.slice(0, 16).replace(/(.{4})(?=.)/g, "$1 ");
  return releasedAt === null ? (
    <Notice kind="note" title={`Issue ${issueNumber} is signed`} live="polite">
      {formatDateTime(signedAt)}, fingerprint <span className="font-mono">{short}</span>. The PDF is
      being written and checked; then the requester is told. You can leave this page.
    </Notice>
  ) : (
    <Notice
      kind="readonly"
      title={`Issue ${issueNumber} is signed and released`}
      actions={<Link href={reportHref}>Read the report</Link>}
    >
      Signed {formatDateTime(signedAt)}, released {formatDateTime(releasedAt)}, fingerprint{" "}
      <span className="font-mono">{short}</span>.
    </Notice>
  );
}
