"use client";

import { Button } from "@/components/ui/button";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import type { Piece } from "@/lib/intake/answers";
import { PIECE_KIND_NAMES, PIECE_KINDS, PIECES_MAX } from "@/lib/intake/constants";

type Props = {
  id: string;
  pieces: Piece[];
  describedBy: string | undefined;
  onChange: (pieces: Piece[]) => void;
};

const NEW: Piece = { name: "", kind: "failed_part", quantity: "1", condition: "" };

/** What is in the box, a row for each piece. */
export function PiecesInput({ id, pieces, describedBy, onChange }: Props) {
  const set = (at: number, change: Partial<Piece>) =>
    onChange(pieces.map((piece, i) => (i === at ? { ...piece, ...change } : piece)));
  return (
    <div
      id={id}
      role="group"
      aria-label="Pieces in the box"
      aria-describedby={describedBy}
      tabIndex={-1}
      className="grid gap-2"
    >
      {pieces.map((piece, i) => (
        <div
          key={i}
          className="grid grid-cols-2 gap-2 lg:grid-cols-[minmax(0,2fr)_11rem_5rem_minmax(0,1fr)_auto]"
        >
          <TextInput
            aria-label={`Piece ${i + 1}, what it is`}
            placeholder="what it is"
            value={piece.name}
            onChange={(event) => set(i, { name: event.target.value })}
          />
          <Select
            aria-label={`Piece ${i + 1}, kind`}
            value={piece.kind}
            options={PIECE_KINDS.map((kind) => ({ value: kind, label: PIECE_KIND_NAMES[kind] }))}
            onChange={(event) => set(i, { kind: event.target.value })}
          />
          <TextInput
            aria-label={`Piece ${i + 1}, how many`}
            inputMode="numeric"
            value={piece.quantity}
            onChange={(event) => set(i, { quantity: event.target.value })}
          />
          <TextInput
            aria-label={`Piece ${i + 1}, condition`}
            placeholder="condition"
            value={piece.condition}
            onChange={(event) => set(i, { condition: event.target.value })}
          />
          <Button look="quiet" onClick={() => onChange(pieces.filter((_piece, at) => at !== i))}>
            Take out
          </Button>
        </div>
      ))}
      <p>
        <Button
          small
          onClick={() => onChange([...pieces, NEW])}
          disabled={pieces.length >= PIECES_MAX}
        >
          Add a piece
        </Button>
      </p>
    </div>
  );
}
