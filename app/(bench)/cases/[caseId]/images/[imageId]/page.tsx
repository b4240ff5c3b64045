import type { Metadata } from "next";
import { SmallScreenGuard } from "@/components/frame/small-screen-guard";
import { Bench } from "@/components/viewer/bench";
import { orNotFound, pageActor } from "@/lib/http/page";
import { getBench, listFilm } from "@/lib/images/marks-queries";
import { routes } from "@/lib/routes";
import { change, place, remove, restore, setScale } from "./actions";

export const metadata: Metadata = { title: "Image bench" };

type Props = {
  params: Promise<{ caseId: string; imageId: string }>;
  searchParams: Promise<{ mark?: string }>;
};

export default async function BenchPage({ params, searchParams }: Props) {
  const actor = await pageActor("case.viewWork");
  const { caseId, imageId } = await params;
  const [{ picture, state }, film] = await Promise.all([
    orNotFound(getBench(actor, caseId, imageId)),
    orNotFound(listFilm(actor, caseId)),
  ]);
  return (
    <SmallScreenGuard title="Image bench" statusHref={routes.case(caseId)}>
      <Bench
        key={imageId}
        picture={picture}
        first={state}
        film={film}
        chosenId={(await searchParams).mark ?? null}
        acts={{ place, change, remove, restore, setScale }}
      />
    </SmallScreenGuard>
  );
}
