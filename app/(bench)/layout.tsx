import { SessionEndWarning } from "@/components/frame/session-end-warning";
import { Toasts } from "@/components/ui/toasts";
import { currentDeadlines } from "@/lib/auth/session";
import { pageActor } from "@/lib/http/page";
import { routes } from "@/lib/routes";

const WARN_BEFORE_MS = 2 * 60_000;

/** The bench takes the whole window: neutral grey in both themes, without bar and spine. */
export default async function BenchLayout({ children }: { children: React.ReactNode }) {
  await pageActor("case.viewWork");
  const endsAfterMs = (await currentDeadlines())?.endsInMs ?? 0;
  return (
    <Toasts>
      <SessionEndWarning
        warnAfterMs={Math.max(0, endsAfterMs - WARN_BEFORE_MS)}
        endsAfterMs={endsAfterMs}
        signInHref={routes.signIn()}
      />
      {children}
    </Toasts>
  );
}
