import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { StateShape } from "@/components/ui/state-shape";
import type { ItemRow } from "@/lib/evidence/list-items";
import { routes } from "@/lib/routes";

type Props = { caseId: string; items: ItemRow[]; chosenId: string | null };

const indentRem = (depth: number) => 0.875 + depth * 1.125;
/** Half of a state's shape, so that a strand runs from the middle of the one above. */
const HALF_SHAPE_REM = 0.4375;

/** Line from an item to what was cut from it. */
function Strand({ depth, isLast }: { depth: number; isLast: boolean }) {
  const left = `${indentRem(depth - 1) + HALF_SHAPE_REM}rem`;
  return (
    <>
      <span
        aria-hidden="true"
        className="absolute top-[-0.875rem] z-1 h-[2.25rem] w-2.5 rounded-bl-4 border-b border-l border-control"
        style={{ left }}
      />
      {!isLast && (
        <span
          aria-hidden="true"
          className="absolute inset-y-0 z-1 w-px bg-control"
          style={{ left }}
        />
      )}
    </>
  );
}

/** Items as a tree: what was cut stands under what it was cut from. */
export function ItemTree({ caseId, items, chosenId }: Props) {
  const branch = (parentId: string | null, depth: number): React.ReactNode => {
    const children = items.filter((item) => item.parentId === parentId);
    if (children.length === 0) return null;
    return (
      <ul>
        {children.map((item, i) => (
          <li key={item.id} className="relative">
            {depth > 0 && <Strand depth={depth} isLast={i === children.length - 1} />}
            <Link
              href={routes.evidence(caseId, item.id)}
              aria-current={item.id === chosenId ? "true" : undefined}
              className={classNames(
                "relative flex min-h-11 items-center gap-2.5 border-b border-rule py-1.5 pr-3 text-13 text-ink no-underline -outline-offset-2",
                item.id === chosenId && "bg-action-tint",
              )}
              style={{ paddingLeft: `${indentRem(depth)}rem` }}
            >
              <StateShape
                state={
                  item.breaks.length > 0 || item.entries.length === 0
                    ? "needs-attention"
                    : "complete"
                }
              />
              <span className="font-mono font-medium">{item.label}</span>
              <span className="min-w-0">
                <span className="block truncate font-strong">{item.content.name}</span>
                <span className="block truncate text-12 text-ink-3">
                  {item.entries.at(-1)?.toPlace ?? "Nowhere yet"}
                </span>
              </span>
            </Link>
            {branch(item.id, depth + 1)}
          </li>
        ))}
      </ul>
    );
  };
  return branch(null, 0);
}
