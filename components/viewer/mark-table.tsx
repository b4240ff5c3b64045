import type { BenchMark } from "@/lib/images/bench-state";
import { MARK_TOOL_NAMES } from "@/lib/images/mark-names";

/** The marks as a table, for those who hear the page. */
export function MarkTable({ marks }: { marks: readonly BenchMark[] }) {
  return (
    <table className="sr-only">
      <caption>Marks and their values</caption>
      <thead>
        <tr>
          <th scope="col">Mark</th>
          <th scope="col">Kind</th>
          <th scope="col">Values</th>
        </tr>
      </thead>
      <tbody>
        {marks.map((mark) => (
          <tr key={mark.id}>
            <td>{mark.label}</td>
            <td>{MARK_TOOL_NAMES[mark.content.tool]}</td>
            <td>
              {mark.content.measurements
                .map((value) => `${value.label} ${value.refused ?? value.text}`)
                .join(", ")}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
