import type { ComponentProps } from "react";
import { classNames } from "@/components/ui/class-names";
import { fieldEdge } from "@/components/ui/field";

export interface TextAreaProps extends ComponentProps<"textarea"> {
  failed?: boolean;
}

export function TextArea({ failed = false, className, rows = 3, ...rest }: TextAreaProps) {
  return (
    <div className={fieldEdge(failed)}>
      <textarea
        rows={rows}
        aria-invalid={failed || undefined}
        className={classNames(
          "block w-full bg-transparent px-[9px] py-1.5 text-14 outline-none read-only:text-ink-2",
          className,
        )}
        {...rest}
      />
    </div>
  );
}
