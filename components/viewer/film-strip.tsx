import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import type { FilmPicture } from "@/lib/images/bench-state";
import { routes } from "@/lib/routes";

type Props = { caseId: string; film: readonly FilmPicture[]; currentId: string };

/** The pictures of the case; the magnification is the recorded one. */
export function FilmStrip({ caseId, film, currentId }: Props) {
  return (
    <nav aria-label="Pictures of the case" className="min-w-0 flex-1 overflow-x-auto">
      <ul className="flex gap-1.5">
        {film.map((picture) => (
          <li key={picture.id} className="shrink-0">
            <Link
              href={routes.image(caseId, picture.id)}
              aria-current={picture.id === currentId ? "page" : undefined}
              aria-label={`${picture.label} ${picture.title}`}
              className={classNames(
                "relative block h-17 w-24 overflow-hidden rounded-2 border",
                picture.id === currentId ? "border-2 border-ib-ink" : "border-ib-rule",
              )}
            >
              {picture.state === "ready" && (
                // eslint-disable-next-line @next/next/no-img-element -- its address asks for the sign-in, which the framework's image service does not have
                <img
                  src={routes.api.thumbnail(picture.id)}
                  alt=""
                  className="size-full object-cover"
                  loading="lazy"
                />
              )}
              <span className="absolute inset-x-0 bottom-0 flex justify-between bg-black/75 px-1 font-mono text-11 text-ib-ink">
                {picture.label.replace("IM-", "")} <span>{picture.magnification}</span>
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
