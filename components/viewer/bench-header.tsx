import Link from "next/link";
import { ChevronLeft, Keyboard, Redo2, Undo2 } from "lucide-react";
import { GateMark } from "@/components/ui/gate-mark";
import type { BenchPicture } from "@/lib/images/bench-state";
import { routes } from "@/lib/routes";
import { benchButton } from "./bench-look";

type Props = {
  picture: BenchPicture;
  isCalibrated: boolean;
  /** The last look at the server failed. */
  isStale: boolean;
  canUndo: boolean;
  canRedo: boolean;
  onUndo: () => void;
  onRedo: () => void;
  onKeys: () => void;
};

/** What picture this is, whether it has a scale, and the steps back and forth. */
export function BenchHeader(props: Props) {
  const { picture } = props;
  const images = routes.images(picture.caseId);
  return (
    <header className="absolute inset-x-0 top-0 z-20 flex h-12 items-center gap-3 border-b border-ib-rule bg-ib-panel px-3 text-13">
      <Link
        href={images}
        className="flex h-11 items-center gap-1 text-ib-ink no-underline hover:text-ib-ink"
      >
        <ChevronLeft size={16} aria-hidden="true" /> Images
      </Link>
      <span className="font-mono text-12 whitespace-nowrap text-ib-ink-2">
        {picture.caseNumber} / {picture.label}
      </span>
      <b className="raw truncate font-head">{picture.title}</b>
      <span className="truncate text-ib-ink-2 max-xl:hidden">{picture.facts}</span>
      {props.isCalibrated ? (
        <span className="flex items-center gap-1.5 whitespace-nowrap text-ib-length">
          <GateMark met /> Calibrated
        </span>
      ) : (
        <span className="whitespace-nowrap text-ib-origin">▲ Not calibrated</span>
      )}
      {props.isStale && <span className="text-ib-origin">No connection; this may be old</span>}
      <span className="ml-auto flex gap-2">
        <button
          type="button"
          title="Keys (?)"
          className={benchButton({ small: true })}
          onClick={props.onKeys}
        >
          <Keyboard size={15} aria-hidden="true" /> Keys
        </button>
        <button
          type="button"
          className={benchButton({ small: true })}
          disabled={!props.canUndo}
          onClick={props.onUndo}
        >
          <Undo2 size={15} aria-hidden="true" /> Undo
        </button>
        <button
          type="button"
          className={benchButton({ small: true })}
          disabled={!props.canRedo}
          onClick={props.onRedo}
        >
          <Redo2 size={15} aria-hidden="true" /> Redo
        </button>
        <Link href={images} className={benchButton({ small: true, primary: true })}>
          Done
        </Link>
      </span>
    </header>
  );
}
