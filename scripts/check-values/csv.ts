/** A CSV file that cannot be read as rows under a header. */
export class CsvError extends Error {}

/** Fields of each line by RFC 4180: quoted fields may hold commas, line breaks and doubled quotes. */
function parseFields(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let field = "";
  let isQuoted = false;
  const endField = () => {
    row.push(field);
    field = "";
  };
  const endRow = () => {
    endField();
    if (row.length > 1 || row[0] !== "") rows.push(row);
    row = [];
  };
  for (let at = 0; at < text.length; at += 1) {
    const character = text[at];
    if (isQuoted) {
      if (character !== '"') field += character;
      else if (text[at + 1] === '"') {
        field += '"';
        at += 1;
      } else isQuoted = false;
    } else if (character === '"' && field === "") isQuoted = true;
    else if (character === ",") endField();
    else if (character === "\n") endRow();
    else if (character !== "\r") field += character;
  }
  if (isQuoted) throw new CsvError("A quoted field is not closed.");
  endRow();
  return rows;
}

export type CsvRow = Readonly<Record<string, string>>;

/** Rows as records of the header's names; a row of another length fails with its number. */
export function parseCsv(text: string): { header: readonly string[]; rows: readonly CsvRow[] } {
  const [header, ...lines] = parseFields(text.replace(/^\uFEFF/, ""));
  if (!header) throw new CsvError("The file is empty.");
  const rows = lines.map((fields, index) => {
    if (fields.length !== header.length)
      throw new CsvError(
        `Row ${index + 2} has ${fields.length} fields; the header has ${header.length}.`,
      );
    return Object.fromEntries(header.map((name, column) => [name, fields[column] ?? ""]));
  });
  return { header, rows };
}
