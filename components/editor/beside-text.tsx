import { Button } from "@/components/ui/button";
import { classNames } from "@/components/ui/class-names";

type Props = { isOpen: boolean; onClose: () => void; children: React.ReactNode };

/** What stands beside the text; on a narrow screen it is a drawer that opens when asked for. */
export function BesideText({ isOpen, onClose, children }: Props) {
  return (
    <aside
      aria-label="Beside the text"
      className={classNames(
        "overflow-y-auto border-l border-rule-2 bg-surface xl:sticky xl:top-[6.5rem] xl:max-h-[calc(100dvh-6.5rem)]",
        isOpen
          ? "max-xl:fixed max-xl:top-[6.5rem] max-xl:right-0 max-xl:bottom-0 max-xl:z-20 max-xl:w-80 max-xl:shadow-lift-2"
          : "max-xl:hidden",
      )}
    >
      <p className="flex justify-end p-2 xl:hidden">
        <Button small look="quiet" onClick={onClose}>
          Close
        </Button>
      </p>
      {children}
    </aside>
  );
}
