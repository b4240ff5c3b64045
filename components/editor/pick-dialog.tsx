"use client";

import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";

type Choice = { id: string; label: string; words: string; picture?: string };
type Props = {
  title: string;
  none: string;
  choices: readonly Choice[];
  isOpen: boolean;
  onClose: () => void;
  onPick: (id: string) => void;
};

/** Chooses a picture or a traverse of the case. */
export function PickDialog({ title, none, choices, isOpen, onClose, onPick }: Props) {
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      width="form"
      title={title}
      footer={<Button onClick={onClose}>Not now</Button>}
    >
      {choices.length === 0 ? (
        <p className="text-13 text-ink-2">{none}</p>
      ) : (
        <ul className="grid max-h-[60dvh] gap-2 overflow-y-auto sm:grid-cols-3">
          {choices.map((choice) => (
            <li key={choice.id}>
              <button
                type="button"
                className="grid w-full gap-1 border border-rule-2 p-2 text-left text-13 hover:border-action"
                onClick={() => onPick(choice.id)}
              >
                {choice.picture && (
                  // eslint-disable-next-line @next/next/no-img-element -- its address asks for the sign-in, which the framework's image service does not have
                  <img
                    src={choice.picture}
                    alt=""
                    className="aspect-4/3 w-full bg-well object-cover"
                    loading="lazy"
                  />
                )}
                <span className="font-mono text-12">{choice.label}</span>
                <span className="raw line-clamp-2 text-12 text-ink-2">{choice.words}</span>
              </button>
            </li>
          ))}
        </ul>
      )}
    </Dialog>
  );
}
