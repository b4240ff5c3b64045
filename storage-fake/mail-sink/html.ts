/** Text that is already HTML and may be joined into a page as it stands. */
export class Html {
  constructor(readonly text: string) {}
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

type Value = string | number | Html | Html[];

/** Tagged template that escapes every value but `Html`. */
export function html(strings: TemplateStringsArray, ...values: Value[]): Html {
  const parts = values.map((value) => {
    if (value instanceof Html) return value.text;
    if (Array.isArray(value)) return value.map((each) => each.text).join("");
    return escape(String(value));
  });
  return new Html(strings.map((text, place) => text + (parts[place] ?? "")).join(""));
}

/** Escaped text in which web addresses are links. */
export function linkedText(text: string): Html {
  const pieces = text.split(/(https?:\/\/[^\s<>"']*[^\s<>"'.,;:!?)\]])/);
  return new Html(
    pieces
      .map((piece, place) =>
        place % 2 === 1 ? html`<a href="${piece}" rel="noreferrer">${piece}</a>` : html`${piece}`,
      )
      .map((piece) => piece.text)
      .join(""),
  );
}
