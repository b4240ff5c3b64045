import { Kbd } from "@/components/ui/kbd";
import type { Answers } from "@/lib/intake/answers";
import { packingAdvice } from "@/lib/intake/packing-advice";

/** What happens after sending, and how to pack the parts. */
export function HelpPanel({ answers }: { answers: Answers }) {
  return (
    <>
      <div className="grid gap-1.5">
        <h2 className="font-head">What happens next</h2>
        <p className="text-ink-2">1. You get a case number and write it on the box.</p>
        <p className="text-ink-2">2. The laboratory accepts the parts and tells you the date.</p>
        <p className="text-ink-2">3. You can add photographs until the report is signed.</p>
      </div>
      <div className="grid gap-1.5">
        <h2 className="font-head">Before you pack</h2>
        {packingAdvice(answers).map((advice) => (
          <p key={advice} className="text-ink-2">
            {advice}
          </p>
        ))}
      </div>
      <p className="border-t border-rule pt-3 text-12 text-ink-3">
        Every question takes a value, or why there is none. <Kbd>Ctrl</Kbd> <Kbd>Enter</Kbd> sends,{" "}
        <Kbd>Alt</Kbd> <Kbd>↓</Kbd> goes to the next section.
      </p>
    </>
  );
}
