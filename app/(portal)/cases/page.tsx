import { pageActor } from "@/lib/http/page";

export default async function CasesPage() {
  await pageActor("case.list");
  return <main id="main">Cases</main>;
}
