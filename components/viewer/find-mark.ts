import type { BenchMark, BenchState } from "@/lib/images/bench-state";
import { type Geometry, pointsOf } from "@/lib/images/mark-schemas";
import { routes } from "@/lib/routes";

/** One mark as it is now, in place or deleted. @throws when the server gives no answer */
export async function findMark(
  imageId: string,
  markId: string,
): Promise<{ mark: BenchMark; isDeleted: boolean } | null> {
  const answer = await fetch(routes.api.marks(imageId), { cache: "no-store" });
  if (!answer.ok) throw new Error(`status ${answer.status}`);
  const { marks, deleted }: BenchState = await answer.json();
  const isIt = (mark: BenchMark) => mark.id === markId;
  const mark = marks.find(isIt) ?? deleted.find(isIt);
  return mark ? { mark, isDeleted: deleted.includes(mark) } : null;
}

/** Whether two shapes have the same points; what follows from a new scale does not count. */
export function isSameShape(one: Geometry, other: Geometry): boolean {
  return (
    one.tool === other.tool && JSON.stringify(pointsOf(one)) === JSON.stringify(pointsOf(other))
  );
}
