"use client";

import { useOnline } from "@/components/frame/use-online";
import { Shape } from "@/components/ui/shapes";

/** Says in the top bar that there is no connection; says nothing otherwise. */
export function OfflineMark() {
  const online = useOnline();
  return (
    <span role="status">
      {online ? null : (
        <span className="inline-flex items-center gap-1.5 rounded-2 bg-warn-tint px-1.5 text-13 whitespace-nowrap text-warn">
          <Shape name="offline" size={14} />
          No connection
        </span>
      )}
    </span>
  );
}
