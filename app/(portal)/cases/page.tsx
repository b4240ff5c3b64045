import type { Metadata } from "next";
import { Plus } from "lucide-react";
import { PageHeader } from "@/components/frame/page-header";
import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { roleMay } from "@/lib/auth/policy";
import { countCases, listCases } from "@/lib/cases/list-cases";
import { listChoices } from "@/lib/cases/list-choices";
import { BUILT_IN_VIEWS, listQuery, parseListParams } from "@/lib/cases/list-params";
import { listViews } from "@/lib/cases/saved-views";
import { pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";
import { CaseFilters } from "./_components/case-filters";
import { CaseTable } from "./_components/case-table";
import { TemperLegend } from "./_components/temper-legend";
import { ViewTabs } from "./_components/view-tabs";

export const metadata: Metadata = { title: "Cases" };

const COUNTED = 100;

type Search = Record<string, string | string[] | undefined>;

export default async function CasesPage({ searchParams }: { searchParams: Promise<Search> }) {
  const actor = await pageActor("case.list");
  const params = parseListParams(await searchParams);
  const [list, count, choices, views] = await Promise.all([
    listCases(actor, params),
    countCases(actor, params, COUNTED),
    listChoices(actor),
    listViews(actor),
  ]);
  const mayOpen = roleMay(actor, "case.create");
  const isFiltered = listQuery({ ...params, view: "", saved: "", sort: "due", dir: "asc" }) !== "";
  const openOne = (
    <LinkButton href={routes.newCase()} look="primary">
      <Plus size={16} aria-hidden="true" /> Open a case
    </LinkButton>
  );
  return (
    <main id="main" tabIndex={-1} className="flex min-h-[calc(100dvh-3rem)] flex-col">
      <PageHeader
        title="Cases"
        note={count >= COUNTED ? `${COUNTED} or more` : `${count} shown here`}
        actions={mayOpen ? openOne : null}
      />
      <ViewTabs
        builtIn={BUILT_IN_VIEWS.filter(
          (view) => view.key !== "signature" || roleMay(actor, "case.accept"),
        )}
        views={views}
        params={params}
      />
      <CaseFilters params={params} choices={choices} />
      <div className="flex-1 bg-surface">
        {list.rows.length > 0 ? (
          <CaseTable
            list={list}
            params={params}
            showsClient={actor.organisationKind === "laboratory"}
            now={new Date()}
          />
        ) : (
          <EmptyState
            title={isFiltered ? "No case fits" : "No cases here"}
            action={
              isFiltered ? (
                <LinkButton href={routes.cases()}>Clear the filters</LinkButton>
              ) : mayOpen ? (
                openOne
              ) : null
            }
          >
            {isFiltered
              ? "Nothing that you may see fits these filters and words."
              : "A case begins with a field return: what broke, where, and what you want to know."}
          </EmptyState>
        )}
      </div>
      <TemperLegend />
    </main>
  );
}
