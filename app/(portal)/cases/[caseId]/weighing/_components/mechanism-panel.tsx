import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import { StateShape } from "@/components/ui/state-shape";
import { formatDateTime } from "@/lib/format/dates";
import {
  MECHANISM_CODES,
  MECHANISM_VERDICT_NAMES,
  type MechanismVerdict,
} from "@/lib/mechanisms/constants";
import type { MechanismRow } from "@/lib/mechanisms/list-mechanisms";
import { WeighDialog } from "./weigh-dialog";
import { WithdrawDialog } from "./withdraw-dialog";

const SHAPE: Record<MechanismVerdict, "untouched" | "under-way" | "complete"> = {
  open: "untouched",
  stands: "complete",
  weighed_out: "under-way",
  ruled_out: "under-way",
};

type Props = { caseId: string; mechanism: MechanismRow; isReadOnly: boolean };

/** One mechanism with where it stands and why. */
export function MechanismPanel({ caseId, mechanism, isReadOnly }: Props) {
  const { content } = mechanism;
  return (
    <Panel>
      <PanelHead
        title={
          <span className="inline-flex items-center gap-2">
            <StateShape state={SHAPE[content.verdict]} /> {MECHANISM_CODES[content.code]}
          </span>
        }
        note={content.detail}
        actions={
          isReadOnly ? null : (
            <>
              <WeighDialog caseId={caseId} mechanism={mechanism} />
              <WithdrawDialog caseId={caseId} mechanism={mechanism} />
            </>
          )
        }
      />
      <PanelBody>
        <p className="text-13">
          <b className="font-strong">{MECHANISM_VERDICT_NAMES[content.verdict]}</b>
          <span className="text-ink-3">
            {" "}
            {mechanism.label}, {mechanism.by}, {formatDateTime(mechanism.at)}
          </span>
        </p>
        {content.reason && (
          <p className="raw mt-1 max-w-text text-13 whitespace-pre-line">{content.reason}</p>
        )}
      </PanelBody>
    </Panel>
  );
}
