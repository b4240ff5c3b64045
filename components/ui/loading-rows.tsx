import { classNames } from "@/components/ui/class-names";

// Uneven widths read as text; the same ones each time, so that server and browser agree.
const WIDTHS = ["w-[62%]", "w-[40%]", "w-[70%]", "w-[48%]", "w-[55%]", "w-[52%]", "w-[36%]"];

/** Grey bars in row shape after 400 ms; after 5 s it says that it is still working. */
export function LoadingRows({ rows = 5, columns = 3 }: { rows?: number; columns?: number }) {
  return (
    <div role="status" className="appear-late rounded-4 border border-rule-2 bg-surface">
      <span className="sr-only">Loading</span>
      <div aria-hidden="true">
        {Array.from({ length: rows }, (_, row) => (
          <div
            key={row}
            className="flex h-row items-center border-b border-rule px-2.5 last:border-b-0"
          >
            {Array.from({ length: columns }, (_cell, column) => (
              <span key={column} className="flex-1">
                <span
                  className={classNames(
                    "block h-2.5 rounded-2 bg-well",
                    WIDTHS[(row * columns + column) % WIDTHS.length],
                  )}
                />
              </span>
            ))}
          </div>
        ))}
      </div>
      <p className="appear-late border-t border-rule px-2.5 py-2 text-13 text-ink-2 [--appear-after:5s]">
        Still working. You can leave this page.
      </p>
    </div>
  );
}
