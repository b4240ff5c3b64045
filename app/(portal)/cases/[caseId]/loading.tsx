import { LoadingRows } from "@/components/ui/loading-rows";

/** Shown in place of a station while it is read; the case bar and the spine stay. */
export default function Loading() {
  return (
    <div className="p-4">
      <LoadingRows />
    </div>
  );
}
