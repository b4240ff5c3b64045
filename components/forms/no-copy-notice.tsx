import { Notice } from "@/components/ui/notice";

/** Said where the browser keeps no copy of what is typed: saving goes on, closing would lose. */
export function NoCopyNotice({ className }: { className?: string }) {
  return (
    <Notice kind="warn" title="This browser keeps no copy." live="polite" className={className}>
      Its storage is full or switched off. What you type is still saved to the laboratory; close
      this page only when it says Saved.
    </Notice>
  );
}
