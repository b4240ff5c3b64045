import { LoadingRows } from "@/components/ui/loading-rows";

export default function Loading() {
  return <LoadingRows />;
}
