import { CASE_STATE_NAMES, STAGE_OF_STATE, STAGES, type CaseState } from "@/lib/cases/constants";
import { classNames } from "@/components/ui/class-names";

export interface TemperStripProps {
  state: CaseState;
  onHold?: boolean;
  /** The word follows the strip; hide it only where the same word stands beside it. */
  wordHidden?: boolean;
  className?: string;
}

/** "Weighing", "Weighing · on hold"; off the scale the state's own word: "Draft", "Declined". */
function stageWord(state: CaseState, onHold: boolean): string {
  const word = STAGES[STAGE_OF_STATE[state] - 1] ?? CASE_STATE_NAMES[state];
  return onHold ? `${word} · on hold` : word;
}

function stageName(state: CaseState, onHold: boolean): string {
  const stage = STAGE_OF_STATE[state];
  const word = STAGES[stage - 1] ?? CASE_STATE_NAMES[state];
  const name = stage === 0 ? word : `Stage ${stage} of ${STAGES.length}: ${word}`;
  return onHold ? `${name}, on hold` : name;
}

function cellStyle(step: number, stage: number, onHold: boolean) {
  if (step > stage) return undefined;
  const fill = `var(--temper-${step})`;
  const background =
    onHold && step === stage
      ? `repeating-linear-gradient(135deg, ${fill} 0 2px, var(--surface) 2px 4px)`
      : fill;
  return { background, borderColor: `var(--temper-${step}-edge)` };
}

/** How far a case is: passed cells keep their colour, the current one is taller, later ones hollow. */
export function TemperStrip({
  state,
  onHold = false,
  wordHidden = false,
  className,
}: TemperStripProps) {
  const stage = STAGE_OF_STATE[state];
  const ended = state === "declined" || state === "cancelled";
  return (
    <span
      role="img"
      aria-label={stageName(state, onHold)}
      className={classNames("inline-flex items-center gap-[9px] whitespace-nowrap", className)}
    >
      <span className="inline-flex h-3.5 items-center gap-px forced-color-adjust-none">
        {STAGES.map((name, index) => (
          <i
            key={name}
            style={cellStyle(index + 1, stage, onHold)}
            className={classNames(
              index + 1 === stage ? "h-3.5 w-[9px] border-[1.5px]" : "size-2 border",
              ended ? "border-rule-2 bg-well" : "border-rule-2",
            )}
          />
        ))}
      </span>
      {wordHidden ? null : (
        <span className={ended ? "text-ink-3" : undefined}>{stageWord(state, onHold)}</span>
      )}
    </span>
  );
}
