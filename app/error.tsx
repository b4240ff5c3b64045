"use client";

import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <main className="mx-auto max-w-text px-6 py-16">
      <Notice
        kind="bad"
        title="Riverline failed at this page"
        live="assertive"
        actions={
          <Button small onClick={reset}>
            Try again
          </Button>
        }
      >
        Nothing was changed, and what you had saved is kept. Try again
        {error.digest ? `; if it stays, quote the number ${error.digest}` : ""}.
      </Notice>
    </main>
  );
}
