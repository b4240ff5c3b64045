import { LoadingRows } from "@/components/ui/loading-rows";

export default function Loading() {
  return (
    <main id="main" className="p-4">
      <LoadingRows />
    </main>
  );
}
