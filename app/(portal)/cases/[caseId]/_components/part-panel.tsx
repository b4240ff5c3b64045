import Link from "next/link";
import { Dash } from "@/components/ui/dash";
import { Facts } from "@/components/ui/facts";
import { Panel, PanelBody, PanelHead } from "@/components/ui/panel";
import type { CaseOverview } from "@/lib/cases/case-overview";
import { routes } from "@/lib/routes";

const given = (text: string | null) => text || <Dash words="not stated" />;

/** What the case is about, as the field return states it. */
export function PartPanel({ overview, mayRead }: { overview: CaseOverview; mayRead: boolean }) {
  const { part, people } = overview;
  return (
    <Panel>
      <PanelHead
        title="The part"
        note={[part.name, part.drawing && `drawing ${part.drawing}`].filter(Boolean).join(", ")}
        actions={mayRead ? <Link href={routes.fieldReturn(overview.id)}>Field return</Link> : null}
      />
      <PanelBody>
        <div className="grid gap-x-8 sm:grid-cols-2">
          <Facts
            facts={[
              { name: "Material", value: given(part.material) },
              { name: "Heat", value: given(part.heat), mono: part.heat !== "" },
              { name: "Serial", value: given(part.serial), mono: part.serial !== "" },
              {
                name: "Earlier",
                value:
                  overview.earlier.length === 0
                    ? "None on this drawing"
                    : overview.earlier.map((earlier, i) => (
                        <span key={earlier.caseId}>
                          {i > 0 && ", "}
                          <Link
                            href={routes.case(earlier.caseId)}
                            className="font-mono text-12"
                            title={earlier.title}
                          >
                            {earlier.number}
                          </Link>
                        </span>
                      )),
              },
            ]}
          />
          <Facts
            facts={[
              { name: "Sent by", value: people.requester },
              { name: "Investigator", value: given(people.investigator) },
              { name: "Second reader", value: given(people.secondReader) },
              { name: "Priority", value: given(overview.priority) },
            ]}
          />
        </div>
      </PanelBody>
    </Panel>
  );
}
