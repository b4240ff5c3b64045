import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Kbd } from "@/components/ui/kbd";
import { KEY_LIST } from "./bench-keys";

type Props = { letters: boolean; onLetters: (on: boolean) => void; onClose: () => void };

/** The keys of the bench, and the switch for those that are single letters. */
export function KeyList({ letters, onLetters, onClose }: Props) {
  return (
    <Dialog
      open
      width="form"
      title="Keys of the image bench"
      onOpenChange={(isOpen) => !isOpen && onClose()}
      footer={<Button onClick={onClose}>Close</Button>}
    >
      <dl className="grid gap-x-6 text-13 sm:grid-cols-2">
        {KEY_LIST.map(({ keys, does }) => (
          <div key={does} className="flex min-h-8 items-center gap-3 border-b border-rule-2">
            <dt className="w-32 shrink-0 space-x-1">
              {keys.map((key) => (
                <Kbd key={key}>{key}</Kbd>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <label className="mt-3 flex min-h-8 items-center gap-2 text-13 pointer-coarse:min-h-11">
        <input
          type="checkbox"
          checked={letters}
          onChange={(event) => onLetters(event.target.checked)}
          className="size-[18px]"
        />
        Single letters and signs are keys. Turn this off when you dictate.
      </label>
    </Dialog>
  );
}
