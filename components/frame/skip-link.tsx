export const MAIN_ID = "main";

/** First stop of the keyboard: past the bars and the spine to the page itself. */
export function SkipLink() {
  return (
    <a
      href={`#${MAIN_ID}`}
      className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-50 focus:rounded-3 focus:bg-surface focus:px-3 focus:py-2 focus:shadow-lift-2"
    >
      Skip to the page
    </a>
  );
}
