import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import type { CaseOverview } from "@/lib/cases/case-overview";
import type { SeatChoices } from "@/lib/cases/seat-choices";
import { AssignmentDialog } from "./assignment-dialog";
import { ClearHoldDialog } from "./clear-hold-dialog";
import { HoldDialog } from "./hold-dialog";
import { ReasonDialog } from "./reason-dialog";

export type TriageRights = {
  accept: boolean;
  askBack: boolean;
  decline: boolean;
  cancel: boolean;
  assign: boolean;
  hold: boolean;
  clearHold: boolean;
};

/** What this person can decide about the case as a whole; nothing is shown when it is nothing. */
export function TriagePanel({
  overview,
  rights,
  seats,
}: {
  overview: CaseOverview;
  rights: TriageRights;
  seats: SeatChoices;
}) {
  if (!Object.values(rights).some(Boolean)) return null;
  return (
    <Panel>
      <PanelHead
        title={rights.accept ? "Triage" : "The case as a whole"}
        note={rights.accept ? "Accept, ask or decline" : undefined}
      />
      <PanelBody>
        {rights.accept && overview.earlier.length > 0 && (
          <p className="mb-3 text-13 text-ink-2">
            {overview.earlier.length} earlier on this drawing, named under “Earlier”. Look at them
            first.
          </p>
        )}
        <div className="flex flex-wrap gap-2">
          {rights.accept && (
            <AssignmentDialog
              caseId={overview.id}
              seats={seats}
              assignment={overview.assignment}
              isAcceptance
            />
          )}
          {rights.askBack && <ReasonDialog caseId={overview.id} kind="ask" />}
          {rights.decline && <ReasonDialog caseId={overview.id} kind="decline" />}
          {rights.assign && !rights.accept && (
            <AssignmentDialog
              caseId={overview.id}
              seats={seats}
              assignment={overview.assignment}
              isAcceptance={false}
            />
          )}
          {rights.hold && <HoldDialog caseId={overview.id} />}
          {rights.clearHold &&
            overview.holds.map((hold) => (
              <ClearHoldDialog key={hold.id} caseId={overview.id} hold={hold} />
            ))}
          {rights.cancel && <ReasonDialog caseId={overview.id} kind="cancel" />}
        </div>
      </PanelBody>
    </Panel>
  );
}
