import type { ComponentProps } from "react";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";

/** What is wrong with one field: what happened, what was kept, what to do. */
export function ErrorText({ className, children, ...rest }: ComponentProps<"span">) {
  return (
    <span className={classNames("mt-1.5 flex gap-1.5 text-12 text-bad", className)} {...rest}>
      <Shape name="triangle" size={14} className="mt-px shrink-0" />
      <span>{children}</span>
    </span>
  );
}
