import Link from "next/link";
import type { ComponentProps } from "react";
import { buttonClasses, type ButtonShape } from "@/components/ui/button-look";
import { classNames } from "@/components/ui/class-names";

/** A link that looks like a button; use it where the act is going to another page. */
export function LinkButton({
  look,
  small,
  icon,
  className,
  ...rest
}: ComponentProps<typeof Link> & ButtonShape) {
  return <Link className={classNames(buttonClasses({ look, small, icon }), className)} {...rest} />;
}
