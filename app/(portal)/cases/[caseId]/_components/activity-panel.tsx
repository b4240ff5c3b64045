import Link from "next/link";
import { Panel, PanelHead } from "@/components/ui/panel";
import { formatRecent } from "@/lib/format/dates";

type Props = {
  activity: { at: string; who: string; what: string }[];
  historyHref: string;
  now: Date;
};

/** The newest entries of the history. */
export function ActivityPanel({ activity, historyHref, now }: Props) {
  return (
    <Panel>
      <PanelHead title="Activity" actions={<Link href={historyHref}>History</Link>} />
      <ul className="px-3.5 py-1.5 text-13">
        {activity.map((event, i) => (
          <li key={i} className="grid grid-cols-[6.5rem_1fr] py-1">
            <time dateTime={event.at} className="tn text-ink-3">
              {formatRecent(event.at, now)}
            </time>
            <span>
              <b className="font-strong">{event.who}</b> {event.what}
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
