"use client";

import { SpineDrawing } from "@/components/frame/spine-drawing";
import { spineGeometry } from "@/components/frame/spine-geometry";
import { PART_STATE_NAMES } from "@/components/ui/state-shape";
import type { Answers } from "@/lib/intake/answers";
import type { Problems } from "@/lib/intake/check-answers";
import { SECTIONS } from "@/lib/intake/fields";
import { sectionProgress } from "@/lib/intake/section-progress";

/** Sections of the field return as strands: how far each is, and the way to it. */
export function SectionSpine({ answers, problems }: { answers: Answers; problems: Problems }) {
  const geometry = spineGeometry(SECTIONS.length);
  const progress = SECTIONS.map((section) => sectionProgress(section, answers, problems));
  return (
    <nav
      aria-label="Sections"
      className="relative w-spine shrink-0 border-r border-rule-2 bg-surface-2 max-lg:w-spine-narrow"
    >
      <div className="sticky top-[6.5rem]" style={{ height: `${geometry.height / 16}rem` }}>
        <ul className="pt-2.5">
          {SECTIONS.map((section, i) => {
            const { answered, asked, toCorrect, state } = progress[i] ?? {
              answered: 0,
              asked: 0,
              toCorrect: 0,
              state: "untouched",
            };
            return (
              <li key={section.key}>
                <a
                  href={`#section-${section.key}`}
                  className="relative flex h-[3.25rem] flex-col justify-center pr-3 pl-[3.875rem] leading-[1.125rem] text-ink no-underline -outline-offset-2 hover:text-ink"
                >
                  <span className="whitespace-nowrap max-lg:sr-only">
                    {section.title}
                    <span className="sr-only">, {PART_STATE_NAMES[state]}</span>
                  </span>
                  <span
                    className={`text-12 max-lg:sr-only ${toCorrect > 0 ? "text-warn" : "text-ink-3"}`}
                  >
                    {toCorrect > 0 ? `${toCorrect} to correct` : `${answered} of ${asked}`}
                  </span>
                </a>
              </li>
            );
          })}
        </ul>
        <SpineDrawing
          geometry={geometry}
          states={progress.map(({ state }) => state)}
          currentIndex={-1}
        />
        <p
          className="absolute right-3 left-[3.875rem] text-12 text-ink-2 max-lg:sr-only"
          style={{ top: `${(geometry.originY - 17) / 16}rem` }}
        >
          <b className="block font-strong text-ink">Open the case</b>
          Number is given when you send it
        </p>
      </div>
    </nav>
  );
}
