import type { Actor } from "@/lib/auth/actor";
import { type AnnexBlock, readAnnexes } from "@/lib/findings/read-annexes";

/** Under the text: the parts of the report that the portal makes from the records. */
export async function Annexes({ actor, caseId }: { actor: Actor; caseId: string }) {
  const annexes = await readAnnexes(actor, caseId);
  return (
    <section
      aria-label="Annexes"
      className="mx-auto my-4 max-w-sheet bg-paper px-6 py-8 text-paper-ink sm:px-18"
    >
      <h2 className="font-serif text-sheet-head font-head">Annexes</h2>
      <p className="mt-1 text-13 text-paper-ink-2">
        Made from the records when the report is printed; nobody writes them. As they stood when
        this page was loaded.
      </p>
      {annexes.map(({ title, blocks }) => (
        <details key={title} className="mt-2 border-t border-paper-rule pt-2 text-13">
          <summary className="min-h-6 cursor-pointer font-strong">
            {title.replace(/^Annex: (.)/, (_all, first: string) => first.toUpperCase())}
          </summary>
          <div className="mt-2 grid gap-2 overflow-x-auto">
            {blocks.map((block, i) => (
              <ShownBlock key={i} block={block} />
            ))}
          </div>
        </details>
      ))}
    </section>
  );
}

function ShownBlock({ block }: { block: AnnexBlock }) {
  if (block.kind === "paragraph") return <p className="raw">{block.text}</p>;
  if (block.kind === "list") {
    return (
      <ul className="raw list-disc pl-5">
        {block.items.map((item) => (
          <li key={item}>{item}</li>
        ))}
      </ul>
    );
  }
  return (
    <table className="w-full border-collapse text-left">
      <thead>
        <tr className="border-b border-paper-rule text-12">
          {block.head.map((cell) => (
            <th key={cell} scope="col" className="py-1 pr-3 align-bottom font-strong">
              {cell}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {block.rows.map((row, i) => (
          <tr key={i} className="border-b border-paper-rule align-top last:border-0">
            {row.map((cell, j) => (
              <td key={j} className="raw py-1 pr-3 break-words">
                {cell}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
