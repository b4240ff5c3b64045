import type { ComponentProps, ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";

/** A ruled area on the bench. No shadow: only what floats has one. */
export function Panel({ className, ...rest }: ComponentProps<"section">) {
  return (
    <section
      className={classNames("rounded-4 border border-rule-2 bg-surface", className)}
      {...rest}
    />
  );
}

export interface PanelHeadProps {
  title: ReactNode;
  /** Quiet words after the title: a count, a drawing number. */
  note?: ReactNode;
  /** At the right: one link or a small button. */
  actions?: ReactNode;
  level?: 2 | 3;
  /** Id for the heading, so that the panel can be labelled by it. */
  id?: string;
}

export function PanelHead({ title, note, actions, level = 2, id }: PanelHeadProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="flex min-h-10 flex-wrap items-center gap-x-2.5 border-b border-rule px-3.5 py-1">
      <Heading id={id} className="text-14 font-head">
        {title}
      </Heading>
      {note ? <span className="text-13 text-ink-3">{note}</span> : null}
      {actions ? (
        <div className="ml-auto flex items-center gap-2 text-13 text-ink-2">{actions}</div>
      ) : null}
    </div>
  );
}

export function PanelBody({ className, ...rest }: ComponentProps<"div">) {
  return <div className={classNames("p-3.5", className)} {...rest} />;
}
