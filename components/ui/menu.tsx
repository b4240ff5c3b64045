"use client";

import { Menu as BaseMenu } from "@base-ui/react/menu";
import Link from "next/link";
import type { ReactElement, ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { Kbd } from "@/components/ui/kbd";
import { Shape } from "@/components/ui/shapes";

const ITEM =
  "flex min-h-[30px] w-full cursor-default items-center gap-3 rounded-2 px-2.5 text-13 no-underline outline-none select-none data-highlighted:bg-action-tint data-disabled:text-ink-3 pointer-coarse:min-h-touch";

export function Menu({
  trigger,
  children,
  align = "start",
}: {
  trigger: ReactElement;
  children: ReactNode;
  align?: "start" | "end";
}) {
  return (
    <BaseMenu.Root>
      <BaseMenu.Trigger render={trigger} />
      <BaseMenu.Portal>
        <BaseMenu.Positioner sideOffset={4} align={align} className="z-50 outline-none">
          <BaseMenu.Popup className="min-w-[13.75rem] rounded-4 bg-surface p-1 shadow-lift-2 outline-none">
            {children}
          </BaseMenu.Popup>
        </BaseMenu.Positioner>
      </BaseMenu.Portal>
    </BaseMenu.Root>
  );
}

export interface MenuItemProps {
  children: ReactNode;
  /** The key that does the same: "C", "Ctrl C". */
  keys?: string;
  /** The damaging act; put it last, after a MenuRule. */
  danger?: boolean;
  /** Why it is not open now; shown under the words. */
  disabledReason?: string | null;
  onSelect: () => void;
}

export function MenuItem({ children, keys, danger, disabledReason, onSelect }: MenuItemProps) {
  return (
    <BaseMenu.Item
      disabled={Boolean(disabledReason)}
      onClick={onSelect}
      className={classNames(ITEM, danger ? "text-bad" : "text-ink")}
    >
      <span>
        {children}
        {disabledReason ? <span className="block pb-1 text-12">{disabledReason}</span> : null}
      </span>
      {keys ? (
        <span className="ml-auto">
          <Kbd>{keys}</Kbd>
        </span>
      ) : null}
    </BaseMenu.Item>
  );
}

export function MenuLink({ href, children }: { href: string; children: ReactNode }) {
  return (
    <BaseMenu.LinkItem
      closeOnClick
      render={<Link href={href} />}
      className={classNames(ITEM, "text-ink")}
    >
      {children}
    </BaseMenu.LinkItem>
  );
}

export function MenuRule() {
  return <BaseMenu.Separator className="my-1 border-t border-rule" />;
}

/** Choices of which one holds; the tick stands at the chosen one. */
export function MenuChoices({
  label,
  value,
  onValueChange,
  choices,
}: {
  label: string;
  value: string | undefined;
  onValueChange: (value: string) => void;
  choices: readonly { value: string; label: string }[];
}) {
  return (
    <BaseMenu.Group>
      <BaseMenu.GroupLabel className="px-2.5 pt-1.5 pb-0.5 text-12 text-ink-3">
        {label}
      </BaseMenu.GroupLabel>
      <BaseMenu.RadioGroup
        value={value}
        onValueChange={(chosen: unknown) => onValueChange(String(chosen))}
      >
        {choices.map((choice) => (
          <BaseMenu.RadioItem
            key={choice.value}
            value={choice.value}
            className={classNames(ITEM, "text-ink")}
          >
            {choice.label}
            <BaseMenu.RadioItemIndicator className="ml-auto">
              <Shape name="tick" size={14} />
            </BaseMenu.RadioItemIndicator>
          </BaseMenu.RadioItem>
        ))}
      </BaseMenu.RadioGroup>
    </BaseMenu.Group>
  );
}
