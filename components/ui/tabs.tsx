"use client";

import { Tabs as BaseTabs } from "@base-ui/react/tabs";
import type { ReactNode } from "react";
import { TAB_ROW, tabClasses } from "@/components/ui/tab-look";

export interface TabPart {
  value: string;
  label: ReactNode;
  content: ReactNode;
}

/** Parts of one page of which one is seen at a time. For views with addresses use TabLinks. */
export function Tabs({
  label,
  parts,
  defaultValue,
}: {
  label: string;
  parts: readonly TabPart[];
  defaultValue?: string;
}) {
  return (
    <BaseTabs.Root defaultValue={defaultValue ?? parts[0]?.value}>
      <BaseTabs.List aria-label={label} className={TAB_ROW}>
        {parts.map((part) => (
          <BaseTabs.Tab
            key={part.value}
            value={part.value}
            className={(state) => tabClasses(state.active)}
          >
            {part.label}
          </BaseTabs.Tab>
        ))}
      </BaseTabs.List>
      {parts.map((part) => (
        <BaseTabs.Panel key={part.value} value={part.value} className="pt-3">
          {part.content}
        </BaseTabs.Panel>
      ))}
    </BaseTabs.Root>
  );
}
