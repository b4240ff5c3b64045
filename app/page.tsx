import { redirect } from "next/navigation";
import { pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";

export default async function Home() {
  await pageActor("case.list");
  redirect(routes.cases());
}
