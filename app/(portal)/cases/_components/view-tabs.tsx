"use client";

import { useState } from "react";
import { useRouter } from "next/navigation";
import { Plus } from "lucide-react";
import { useActionForm } from "@/components/forms/use-action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/labelled-fields";
import { TabLinks } from "@/components/ui/tab-links";
import { keptViewQuery, type ListParams, queryToKeep } from "@/lib/cases/list-params";
import { routes } from "@/lib/routes";
import { dropSavedView, keepView } from "../actions";

type View = { id: string; name: string; query: string };
type Props = {
  builtIn: readonly { key: string; name: string }[];
  views: View[];
  params: ListParams;
};

/** Views as tabs: the ones everyone has, then one's own. */
export function ViewTabs({ builtIn, views, params }: Props) {
  const router = useRouter();
  const [isNaming, setNaming] = useState(false);
  const form = useActionForm<View>();
  const drop = useActionForm<void>();
  const own = views.find((view) => view.id === params.saved);
  const plainQuery = queryToKeep(params);
  const isChanged = own !== undefined && own.query !== plainQuery;
  const show = (view: View) => router.push(routes.cases(keptViewQuery(view)));
  return (
    <div>
      <TabLinks
        label="Views"
        items={[
          ...builtIn.map(({ key, name }) => ({
            href: routes.cases(key ? `view=${key}` : ""),
            label: name,
            current: !own && params.view === key,
          })),
          ...views.map((view) => ({
            href: routes.cases(keptViewQuery(view)),
            label: view.name,
            current: own?.id === view.id,
          })),
        ]}
      >
        {own && isChanged && (
          <Button
            small
            look="quiet"
            disabled={form.isBusy}
            onClick={() =>
              form.send(() => keepView({ id: own.id, name: own.name, query: plainQuery }), show)
            }
          >
            Save changes
          </Button>
        )}
        {own && (
          <Button
            small
            look="quiet"
            disabled={drop.isBusy}
            onClick={() =>
              drop.send(
                () => dropSavedView({ id: own.id }),
                () => router.push(routes.cases()),
              )
            }
          >
            Drop this view
          </Button>
        )}
        <Dialog
          open={isNaming}
          onOpenChange={setNaming}
          title="Save this view"
          description="Filters and order are kept under a name, for you alone."
          trigger={
            <Button small look="quiet">
              <Plus size={14} aria-hidden="true" /> Save this view
            </Button>
          }
          footer={
            <>
              <Button onClick={() => setNaming(false)}>Not now</Button>
              <Button type="submit" form="save-view" look="primary" disabled={form.isBusy}>
                Save the view
              </Button>
            </>
          }
        >
          <form
            id="save-view"
            onSubmit={(event) => {
              event.preventDefault();
              const name = String(new FormData(event.currentTarget).get("viewName"));
              form.send(
                () => keepView({ name, query: plainQuery }),
                (view) => {
                  setNaming(false);
                  show(view);
                },
              );
            }}
          >
            <TextField
              name="viewName"
              label="Name"
              maxLength={60}
              required
              error={form.fields.name ?? form.failure}
            />
          </form>
        </Dialog>
      </TabLinks>
    </div>
  );
}
