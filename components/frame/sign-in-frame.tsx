import type { ReactNode } from "react";
import { RiverLines } from "@/components/ui/river-lines";
import { RiverMark } from "@/components/ui/river-mark";

/** The pages before signing in: river lines running together to the dot on the card's edge. */
export function SignInFrame({
  title,
  note,
  below,
  children,
}: {
  title: string;
  /** The laboratory's name. */
  note?: ReactNode;
  /** Under the card. */
  below?: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="relative grid min-h-dvh overflow-hidden md:grid-cols-[minmax(0,1fr)_24.5rem_minmax(2rem,12%)]">
      <p className="absolute top-6 left-6 flex items-center gap-3 text-19 font-head tracking-[-0.014em] md:top-13 md:left-16">
        <RiverMark size={34} />
        Riverline
      </p>
      <p className="absolute bottom-13 left-16 text-13 text-ink-2 max-md:hidden">
        Failure analysis cases, from field return to signed findings.
      </p>
      <main className="relative max-md:mx-auto max-md:w-full max-md:max-w-[24.5rem] max-md:px-4 max-md:pt-20 md:col-start-2 md:my-auto md:py-8">
        <div className="relative">
          {/* 420 of 900 is where the drawing ends; the dot stands on the same height. */}
          <div className="absolute top-61 right-full h-225 w-screen -translate-y-105 max-md:hidden">
            <RiverLines className="absolute right-0 h-full w-[max(54.5rem,calc(88vw-24.5rem))]" />
          </div>
          <span className="absolute top-61 -left-2 z-10 size-4 -translate-y-1/2 rounded-full border-2 border-bench bg-action max-md:hidden" />
          <div className="relative min-h-105 rounded-4 border border-rule-2 bg-surface px-8 [--control-h:2.5rem] pointer-coarse:[--control-h:2.75rem] pt-8 pb-6 max-md:min-h-0 max-md:px-5">
            <h1 className="mb-1 text-24 font-head tracking-[-0.018em]">{title}</h1>
            {note ? <p className="mb-6 text-ink-2">{note}</p> : null}
            {children}
          </div>
        </div>
        {below ? <div className="mt-6 grid gap-2 px-0.5 text-13 text-ink-2">{below}</div> : null}
      </main>
    </div>
  );
}
