import Link from "next/link";
import type { ReactNode } from "react";
import { MainNav, type MainNavItem } from "@/components/frame/main-nav";
import { OfflineMark } from "@/components/frame/offline-mark";
import { PersonMenu, type PersonMenuProps } from "@/components/frame/person-menu";
import { RiverMark } from "@/components/ui/river-mark";

export interface TopBarProps {
  homeHref: string;
  items: readonly MainNavItem[];
  person: Pick<PersonMenuProps, "name" | "roleName">;
  /** Further addresses in the person's menu. */
  links?: PersonMenuProps["links"];
  /** The find field. */
  search?: ReactNode;
  /** Notifications, or another control at the right. */
  children?: ReactNode;
  signOut: () => Promise<void>;
}

export function TopBar({ homeHref, items, person, links, search, children, signOut }: TopBarProps) {
  return (
    <header className="no-print sticky top-0 z-30 flex h-topbar items-stretch border-b border-rule-2 bg-surface px-4">
      <Link
        href={homeHref}
        className="mr-6.5 flex items-center gap-[9px] text-15 font-head tracking-[-0.012em] text-ink no-underline hover:text-ink"
      >
        <RiverMark />
        Riverline
      </Link>
      <div className="max-sm:hidden">
        <div className="flex h-full">
          <MainNav items={items} />
        </div>
      </div>
      <div className="ml-auto flex items-center gap-3">
        <OfflineMark />
        {search ? <div className="max-md:hidden">{search}</div> : null}
        {children}
        <div className="border-l border-rule pl-2">
          <PersonMenu {...person} links={links} signOut={signOut} />
        </div>
      </div>
    </header>
  );
}
