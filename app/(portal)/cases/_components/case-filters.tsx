"use client";

import { useTransition } from "react";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { Search, X } from "lucide-react";
import { Button } from "@/components/ui/button";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { STAGES } from "@/lib/cases/constants";
import { type ListParams, listQuery, SEARCH_MAX } from "@/lib/cases/list-params";
import { routes } from "@/lib/routes";

type Choice = { value: string; label: string };
type Props = { params: ListParams; choices: { clients: Choice[]; investigators: Choice[] } };

/** Filters of the list; all of them stand in the address. */
export function CaseFilters({ params, choices }: Props) {
  const router = useRouter();
  const [isBusy, start] = useTransition();
  const go = (change: Partial<ListParams>) =>
    start(() => router.push(routes.cases(listQuery(params, change))));
  const isSet = listQuery({ ...params, view: "", saved: "", sort: "due", dir: "asc" }) !== "";
  return (
    <form
      role="search"
      aria-busy={isBusy}
      className="flex flex-wrap items-center gap-2 border-b border-rule bg-surface px-4 py-2 text-13"
      onSubmit={(event) => {
        event.preventDefault();
        go({ q: String(new FormData(event.currentTarget).get("q") ?? "").trim() });
      }}
    >
      <div className="w-62">
        <TextInput
          key={params.q}
          name="q"
          aria-label="Find by part, drawing, serial, heat, material or number"
          placeholder="Part, drawing, heat or number"
          defaultValue={params.q}
          maxLength={SEARCH_MAX}
          lead={<Search size={14} aria-hidden="true" />}
        />
      </div>
      <Button type="submit" small>
        Find
      </Button>
      <div className="w-46">
        <Select
          aria-label="Stage"
          value={params.stages.length === 1 ? String(params.stages[0]) : ""}
          onChange={(event) =>
            go({ stages: event.target.value ? [Number(event.target.value)] : [] })
          }
          options={[
            { value: "", label: "Stage: any" },
            ...STAGES.map((name, i) => ({ value: String(i + 1), label: `Stage: ${name}` })),
          ]}
        />
      </div>
      {choices.clients.length > 0 && (
        <div className="w-46">
          <Select
            aria-label="Client"
            value={params.client}
            onChange={(event) => go({ client: event.target.value })}
            options={[
              { value: "", label: "Client: any" },
              ...choices.clients.map((c) => ({ ...c, label: `Client: ${c.label}` })),
            ]}
          />
        </div>
      )}
      {choices.investigators.length > 0 && (
        <div className="w-46">
          <Select
            aria-label="Investigator"
            value={params.investigator}
            onChange={(event) => go({ investigator: event.target.value })}
            options={[
              { value: "", label: "Investigator: anyone" },
              ...choices.investigators.map((c) => ({ ...c, label: `Investigator: ${c.label}` })),
            ]}
          />
        </div>
      )}
      <Button
        small
        aria-pressed={params.hold === "yes"}
        className={params.hold === "yes" ? "border-action bg-action-tint" : undefined}
        onClick={() => go({ hold: params.hold === "yes" ? "" : "yes" })}
      >
        On hold {params.hold === "yes" && <X size={12} aria-hidden="true" />}
      </Button>
      {isSet && (
        <Link href={routes.cases(params.view ? `view=${params.view}` : "")}>Clear filters</Link>
      )}
    </form>
  );
}
