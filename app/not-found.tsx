import { LinkButton } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";

export default function NotFound() {
  return (
    <main className="mx-auto max-w-text px-6 py-16">
      <h1 className="text-19 font-head">This is not here, or it is not yours to see</h1>
      <p className="mt-2 text-ink-2">
        The address may be mistyped, or the case belongs to someone else. If you expected it, ask
        the laboratory.
      </p>
      <p className="mt-5">
        <LinkButton href={routes.cases()}>Go to the cases</LinkButton>
      </p>
    </main>
  );
}
