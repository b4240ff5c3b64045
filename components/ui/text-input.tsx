import { useId, type ComponentProps, type ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { fieldEdge } from "@/components/ui/field";

export interface TextInputProps extends ComponentProps<"input"> {
  /** Unit inside at the right: "mm". It is read out as part of the field's description. */
  unit?: ReactNode;
  /** Shape inside at the left, for a find field. */
  lead?: ReactNode;
  failed?: boolean;
  /** Classes for the box; className goes to the input itself. */
  boxClassName?: string;
}

export function TextInput({
  unit,
  lead,
  failed = false,
  boxClassName,
  className,
  "aria-describedby": described,
  ...rest
}: TextInputProps) {
  const unitId = useId();
  return (
    <div className={classNames(fieldEdge(failed), "flex h-control-h items-center", boxClassName)}>
      {lead ? <span className="pl-2 text-ink-3">{lead}</span> : null}
      <input
        aria-invalid={failed || undefined}
        aria-describedby={classNames(described, Boolean(unit) && unitId) || undefined}
        className={classNames(
          "h-full w-full min-w-0 bg-transparent px-[9px] text-14 outline-none read-only:text-ink-2",
          className,
        )}
        {...rest}
      />
      {unit ? (
        <span id={unitId} className="pr-[9px] text-13 whitespace-nowrap text-ink-3">
          {unit}
        </span>
      ) : null}
    </div>
  );
}
