"use client";

export default function GlobalError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en">
      <body>
        <main>
          <h1>Riverline failed to show this page</h1>
          <p>
            Nothing was changed, and what you had saved is kept. Load the page again
            {error.digest ? `; if it stays, quote the number ${error.digest}` : ""}.
          </p>
        </main>
      </body>
    </html>
  );
}
