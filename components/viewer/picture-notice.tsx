import type { BenchState } from "@/lib/images/bench-state";

type Props = { state: Pick<BenchState, "state" | "refusal">; hasFailed: boolean };

/** Why there is no picture to see. */
export function PictureNotice({ state, hasFailed }: Props) {
  return (
    <p
      role="status"
      className="absolute inset-x-0 top-1/3 z-10 mx-auto max-w-98 text-center text-14"
    >
      {hasFailed
        ? "The picture could not be shown. It is kept; load the page again."
        : state.state === "refused"
          ? `This file was refused. ${state.refusal ?? ""}`
          : "The picture is being checked and cut into tiles. You can leave this page."}
    </p>
  );
}
