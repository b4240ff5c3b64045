import { classNames } from "@/components/ui/class-names";
import type { BenchMark } from "@/lib/images/bench-state";
import { headlineOf, markTitle } from "@/lib/images/mark-names";
import { BENCH_LINK, BENCH_PANEL, benchButton } from "./bench-look";
import { MarkIcon } from "./tools";

type Props = {
  marks: readonly BenchMark[];
  deleted: readonly BenchMark[];
  chosenId: string | null;
  isHidden: boolean;
  isEditing: boolean;
  refusal: string | null;
  onChoose: (id: string | null) => void;
  onHide: () => void;
  onEdit: (mark: BenchMark) => void;
  onDelete: (mark: BenchMark) => void;
  onRestore: (mark: BenchMark) => void;
};

/** Every mark by name and value; the list is the text form of what is drawn. */
export function MarksPanel(props: Props) {
  const { marks, deleted, chosenId, refusal } = props;
  const chosen = marks.find((mark) => mark.id === chosenId) ?? null;
  return (
    <section aria-label="Marks on this image" className={BENCH_PANEL}>
      <header className="flex h-11 items-center justify-between border-b border-ib-rule px-3.5">
        <h2 className="text-13 font-head">Marks on this image</h2>
        {marks.length > 0 && (
          <button type="button" className={BENCH_LINK} onClick={props.onHide}>
            {props.isHidden ? "Show all" : "Hide all"}
          </button>
        )}
      </header>
      {refusal && (
        <p className="border-b border-ib-rule px-3.5 py-2 text-12 text-ib-ink-2">
          Read only. {refusal}
        </p>
      )}
      {marks.length === 0 && (
        <p className="px-3.5 py-3 text-13 text-ib-ink-2">
          No mark yet. Choose a tool and press on the picture.
        </p>
      )}
      <ul className="max-h-[42dvh] overflow-y-auto">
        {marks.map((mark) => {
          const headline = headlineOf(mark.content.measurements);
          return (
            <li key={mark.id}>
              <button
                type="button"
                aria-pressed={mark.id === chosenId}
                onClick={() => props.onChoose(mark.id === chosenId ? null : mark.id)}
                className={classNames(
                  "grid min-h-11 w-full grid-cols-[1rem_2.25rem_minmax(0,1fr)_auto] items-center gap-2 border-b border-ib-rule px-3.5 py-1.5 text-left text-13",
                  mark.id === chosenId && "bg-ib-panel-2 shadow-[inset_3px_0_0_var(--ib-final)]",
                )}
              >
                <MarkIcon tool={mark.content.tool} />
                <span className="font-mono text-12">{mark.label}</span>
                <span className="truncate">{markTitle(mark.content)}</span>
                <span className="tn text-right">
                  <b className="font-strong">{headline?.text ?? ""}</b>
                  {headline?.basis && (
                    <span className="block text-11 text-ib-ink-2">{headline.basis}</span>
                  )}
                </span>
              </button>
            </li>
          );
        })}
      </ul>
      {chosen && (
        <div className="grid gap-2 px-3.5 py-3 text-12">
          {chosen.content.measurements.map((value) => (
            <p key={value.key} className="flex justify-between gap-3">
              <span className="text-ib-ink-2">{value.label}</span>
              <span className="tn text-right">{value.refused ?? value.text}</span>
            </p>
          ))}
          {chosen.content.note && <p className="raw text-ib-ink-2">{chosen.content.note}</p>}
          <p className="text-ib-ink-2">
            {chosen.by}, {chosen.content.confidence}
          </p>
          {refusal === null && !props.isEditing && (
            <div className="flex gap-2">
              <button
                type="button"
                className={benchButton({ small: true })}
                onClick={() => props.onEdit(chosen)}
              >
                Edit points
              </button>
              <button
                type="button"
                className={benchButton({ small: true })}
                onClick={() => props.onDelete(chosen)}
              >
                Delete {chosen.label}
              </button>
            </div>
          )}
        </div>
      )}
      {deleted.length > 0 && (
        <details className="border-t border-ib-rule px-3.5 py-2 text-12">
          <summary className="min-h-6 pointer-coarse:py-3">{deleted.length} deleted</summary>
          <ul>
            {deleted.map((mark) => (
              <li key={mark.id} className="flex min-h-8 items-center justify-between gap-2">
                <s>
                  {mark.label} {markTitle(mark.content)}
                </s>
                {refusal === null && (
                  <button
                    type="button"
                    className={BENCH_LINK}
                    onClick={() => props.onRestore(mark)}
                  >
                    Restore {mark.label}
                  </button>
                )}
              </li>
            ))}
          </ul>
        </details>
      )}
    </section>
  );
}
