import { SavingLine } from "@/components/forms/saving-line";
import type { SavingState } from "@/components/forms/use-draft-saving";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";

type Props = {
  caseId: string;
  issueNumber: number;
  isSigned: boolean;
  state: SavingState<object>;
  keepsCopy: boolean;
  /** Things beside the text that wait for a decision. */
  toSettle: number;
  isRailOpen: boolean;
  onRail: () => void;
};

/** Which issue this is, how far it is saved, and the ways on. */
export function FindingsHead(props: Props) {
  const { caseId, toSettle } = props;
  return (
    <div className="flex flex-wrap items-center justify-between gap-3">
      <h1 className="text-16 font-head">
        Findings <span className="text-13 font-normal text-ink-2">issue {props.issueNumber}</span>
      </h1>
      <span className="flex items-center gap-3">
        <SavingLine state={props.state} keepsCopy={props.keepsCopy} />
        <Button small className="xl:hidden" aria-expanded={props.isRailOpen} onClick={props.onRail}>
          {toSettle > 0 ? `Beside the text, ${toSettle} to settle` : "Beside the text"}
        </Button>
        {props.isSigned ? (
          <LinkButton small href={routes.signOff(caseId)}>
            Signed report
          </LinkButton>
        ) : (
          <LinkButton small href={routes.api.draftPdf(caseId)} prefetch={false} target="_blank">
            Print the draft
          </LinkButton>
        )}
      </span>
    </div>
  );
}
