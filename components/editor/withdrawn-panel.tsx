import { Button } from "@/components/ui/button";
import { Shape } from "@/components/ui/shapes";
import type { UnsettledValue } from "./unsettled-values";

type Props = {
  withdrawn: readonly UnsettledValue[];
  isReadOnly: boolean;
  onShow: (position: number) => void;
  onTakeOut: (position: number) => void;
};

/** Cited values whose source is gone; they stand in the way of sign-off. */
export function WithdrawnPanel({ withdrawn, isReadOnly, onShow, onTakeOut }: Props) {
  if (withdrawn.length === 0) return null;
  return (
    <section aria-label="Withdrawn sources" className="border-b border-rule-2 bg-bad-tint p-4">
      <h2 className="flex items-center gap-2 text-13 font-head">
        <Shape name="cross" size={14} />{" "}
        {withdrawn.length === 1
          ? "The source of 1 cited value was withdrawn"
          : `The sources of ${withdrawn.length} cited values were withdrawn`}
      </h2>
      <p className="mt-1 text-13">
        The report cannot be signed with them. Cite another, or put the source back.
      </p>
      <ul className="mt-2 grid gap-3">
        {withdrawn.map(({ position, tag, cited, section }) => (
          <li key={position} className="grid gap-1.5 text-13">
            <span>
              {cited} from {tag}
              {section && `, under ${section}`}
            </span>
            <span className="flex gap-2">
              {!isReadOnly && (
                <Button small onClick={() => onTakeOut(position)}>
                  Take it out
                </Button>
              )}
              <Button small look="quiet" onClick={() => onShow(position)}>
                Show it
              </Button>
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
