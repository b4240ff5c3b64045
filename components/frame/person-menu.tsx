"use client";

import { useTheme } from "next-themes";
import { useTransition } from "react";
import { Menu, MenuChoices, MenuItem, MenuLink, MenuRule } from "@/components/ui/menu";
import { Avatar } from "@/components/ui/person";
import { Shape } from "@/components/ui/shapes";

const THEMES = [
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
  { value: "system", label: "System" },
] as const;

export interface PersonMenuProps {
  name: string;
  roleName: string;
  /** Further addresses in the menu: "Your account", "People". */
  links?: readonly { href: string; label: string }[];
  signOut: () => Promise<void>;
}

export function PersonMenu({ name, roleName, links = [], signOut }: PersonMenuProps) {
  const { theme, setTheme } = useTheme();
  const [leaving, startLeaving] = useTransition();
  return (
    <Menu
      align="end"
      trigger={
        <button
          type="button"
          className="flex h-control-h items-center gap-2 rounded-3 px-1.5 text-13 whitespace-nowrap hover:bg-surface-2"
        >
          <Avatar name={name} />
          <span>{name}</span>
          <Shape name="chevron" size={14} />
        </button>
      }
    >
      <p className="px-2.5 pt-1 pb-1.5 text-12 text-ink-3">{roleName}</p>
      {links.map(({ href, label }) => (
        <MenuLink key={href} href={href}>
          {label}
        </MenuLink>
      ))}
      <MenuRule />
      <MenuChoices label="Appearance" value={theme} onValueChange={setTheme} choices={THEMES} />
      <MenuRule />
      <MenuItem onSelect={() => startLeaving(signOut)}>
        {leaving ? "Signing out" : "Sign out"}
      </MenuItem>
    </Menu>
  );
}
