import { classNames } from "@/components/ui/class-names";
import { BENCH_PANEL } from "./bench-look";
import { BENCH_TOOLS, type BenchTool, TOOL_KEYS, TOOL_WORDS, ToolIcon } from "./tools";

type Props = {
  tool: BenchTool;
  mayMark: boolean;
  mayScale: boolean;
  isCalibrated: boolean;
  onTool: (tool: BenchTool) => void;
};

/** Tools of the bench; Scale stands out while there is none. */
export function ToolBar({ tool, mayMark, mayScale, isCalibrated, onTool }: Props) {
  const open = BENCH_TOOLS.filter(
    (known) => known === "move" || (known === "scale" ? mayScale : mayMark),
  );
  return (
    <div
      role="toolbar"
      aria-label="Tools"
      aria-orientation="vertical"
      className={`${BENCH_PANEL} absolute top-16 left-3 z-10 grid max-h-[calc(100dvh-12rem)] w-15 overflow-y-auto p-1`}
    >
      {open.map((known) => (
        <button
          key={known}
          type="button"
          aria-pressed={tool === known}
          aria-keyshortcuts={TOOL_KEYS[known]}
          title={`${TOOL_WORDS[known]} (${TOOL_KEYS[known].toUpperCase()})`}
          onClick={() => onTool(known)}
          className={classNames(
            "grid h-12 place-items-center gap-0 rounded-3 pt-1 text-11",
            colours(tool === known, known === "scale" && !isCalibrated),
          )}
        >
          <ToolIcon tool={known} />
          {TOOL_WORDS[known]}
        </button>
      ))}
    </div>
  );
}

function colours(isChosen: boolean, isMissed: boolean): string {
  if (isChosen) return "bg-ib-ink font-strong text-black";
  return isMissed ? "text-ib-origin" : "text-ib-ink-2";
}
