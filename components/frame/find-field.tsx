"use client";

import { useEffect, useRef } from "react";
import { useRouter } from "next/navigation";
import { Search } from "lucide-react";
import { Kbd } from "@/components/ui/kbd";
import { TextInput } from "@/components/ui/text-input";
import { listQuery, parseListParams, SEARCH_MAX } from "@/lib/cases/list-params";
import { routes } from "@/lib/routes";

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName))
  );
}

/** Finds cases from anywhere; the key "/" leads to it. */
export function FindField() {
  const router = useRouter();
  const input = useRef<HTMLInputElement>(null);
  useEffect(() => {
    const toField = (event: KeyboardEvent) => {
      if (
        event.key !== "/" ||
        event.ctrlKey ||
        event.metaKey ||
        event.altKey ||
        isTyping(event.target)
      )
        return;
      event.preventDefault();
      input.current?.focus();
    };
    document.addEventListener("keydown", toField);
    return () => document.removeEventListener("keydown", toField);
  }, []);
  return (
    <form
      role="search"
      aria-label="Find a case"
      className="w-72"
      onSubmit={(event) => {
        event.preventDefault();
        const q = String(new FormData(event.currentTarget).get("find") ?? "").trim();
        if (q) router.push(routes.cases(listQuery(parseListParams({ view: "all" }), { q })));
      }}
    >
      <TextInput
        ref={input}
        name="find"
        aria-label="Find a case by part, drawing, heat or number"
        placeholder="Find a case"
        maxLength={SEARCH_MAX}
        lead={<Search size={15} aria-hidden="true" />}
        unit={<Kbd>/</Kbd>}
      />
    </form>
  );
}
