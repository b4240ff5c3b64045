import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { type CaseState } from "@/lib/cases/constants";
import { stagePeriods } from "@/lib/cases/stage-periods";
import { formatDate, formatDay } from "@/lib/format/dates";

type Props = {
  moves: { to: CaseState; at: string }[];
  dueOn: string | null;
  lead: string | null;
  now: Date;
};

const WIDTH = 724;
const INSET = 14;
const LABEL_MIN = 104;

/** The stages a case went through, each as wide as the days it took, with today and the due date. */
export function ProgressPanel({ moves, dueOn, lead, now }: Props) {
  const periods = stagePeriods(moves, now);
  const first = periods[0];
  if (!first) return null;
  const due = dueOn === null ? null : Date.parse(`${dueOn}T12:00:00Z`);
  const start = Date.parse(first.from);
  const end = Math.max(now.getTime(), due ?? 0, start + 86_400_000);
  const x = (time: number) => INSET + ((time - start) / (end - start)) * (WIDTH - 2 * INSET);
  const days = Math.round((now.getTime() - start) / 86_400_000);
  const isLast = x(now.getTime()) > WIDTH - 60;
  const words = [
    ...periods.map((period) => `${period.stage} from ${formatDay(period.from)}`),
    ...(dueOn ? [`due ${formatDate(dueOn)}`] : []),
  ].join(", ");
  const labelled = spacedOut(periods.map((period) => x(Date.parse(period.from))));
  return (
    <Panel>
      <PanelHead
        title="Progress"
        note={`${days} ${days === 1 ? "day" : "days"} in`}
        actions={lead ? <span className="text-ink-2">Lead {lead}</span> : null}
      />
      <PanelBody>
        <svg
          viewBox={`0 0 ${WIDTH} 78`}
          className="w-full max-w-text"
          role="img"
          aria-label={words}
        >
          {periods.map((period) => (
            <rect
              key={period.from}
              x={x(Date.parse(period.from))}
              y={34}
              width={Math.max(2, x(Date.parse(period.to)) - x(Date.parse(period.from)))}
              height={14}
              fill={`var(--temper-${period.step})`}
              stroke={`var(--temper-${period.step}-edge)`}
            />
          ))}
          {due !== null && due > now.getTime() && (
            <rect
              x={x(now.getTime())}
              y={34.5}
              width={x(due) - x(now.getTime())}
              height={13}
              fill="none"
              stroke="var(--rule-2)"
              strokeDasharray="3 3"
            />
          )}
          <g fontSize={12} fill="var(--ink-2)">
            {periods.map((period, i) =>
              labelled[i] ? (
                <text
                  key={period.from}
                  x={Math.min(x(Date.parse(period.from)), WIDTH - LABEL_MIN)}
                  y={66}
                >
                  {period.stage} {formatDay(period.from)}
                </text>
              ) : null,
            )}
          </g>
          <path d={`M${x(now.getTime())} 14V56`} stroke="var(--ink)" strokeWidth={1.5} />
          <text
            x={x(now.getTime()) + (isLast ? -6 : 6)}
            y={24}
            textAnchor={isLast ? "end" : "start"}
            fontSize={12}
            fontWeight={550}
            fill="var(--ink)"
          >
            Today
          </text>
          {due !== null && (
            <>
              <path d={`M${x(due)} 14V56`} stroke="var(--ink)" strokeWidth={1.5} />
              {Math.abs(x(due) - x(now.getTime())) > 130 && (
                <text
                  x={x(due) + (x(due) < 90 ? 6 : -6)}
                  y={24}
                  textAnchor={x(due) < 90 ? "start" : "end"}
                  fontSize={12}
                  fontWeight={550}
                  fill="var(--ink)"
                >
                  Due {formatDay(dueOn ?? "")}
                </text>
              )}
            </>
          )}
        </svg>
      </PanelBody>
    </Panel>
  );
}

/** Which of the labels at these places fit beside one another, the first first. */
function spacedOut(places: readonly number[]): boolean[] {
  return places.reduce<{ fits: boolean[]; end: number }>(
    ({ fits, end }, place) =>
      place < end
        ? { fits: [...fits, false], end }
        : { fits: [...fits, true], end: place + LABEL_MIN },
    { fits: [], end: -Infinity },
  ).fits;
}
