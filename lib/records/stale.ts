import "server-only";
import { sql } from "drizzle-orm";
import { z } from "zod";
import type { Reader } from "@/db/client";
import { rawRows } from "@/db/raw-rows";

/**
 * Of the given versions, those that are stale: the version itself, or any version it rests on
 * directly or through others, is not the latest of its record or its record is void.
 */
export async function staleVersionIds(
  reader: Reader,
  versionIds: readonly string[],
): Promise<Set<string>> {
  if (versionIds.length === 0) return new Set();
  const ids = sql.join(
    [...new Set(versionIds)].map((id) => sql`${id}`),
    sql`, `,
  );
  const rows = await rawRows(
    reader,
    sql`
    with recursive rests_on (root, id) as (
      select id, id from record_versions where id in (${ids})
      union
      select r.root, e.input_version_id from rests_on r join record_edges e on e.version_id = r.id
    )
    select distinct r.root as root
    from rests_on r
    join record_versions v on v.id = r.id
    join records rec on rec.id = v.record_id
    where v.number <> rec.latest_version or rec.state = 'void'`,
    z.object({ root: z.string() }),
  );
  return new Set(rows.map((row) => row.root));
}

/** The versions under the given ones, themselves included. */
export async function closureOf(reader: Reader, versionIds: readonly string[]): Promise<string[]> {
  if (versionIds.length === 0) return [];
  const ids = sql.join(
    [...new Set(versionIds)].map((id) => sql`${id}`),
    sql`, `,
  );
  const rows = await rawRows(
    reader,
    sql`
    with recursive rests_on (id) as (
      select id from record_versions where id in (${ids})
      union
      select e.input_version_id from rests_on r join record_edges e on e.version_id = r.id
    )
    select id from rests_on`,
    z.object({ id: z.string() }),
  );
  return rows.map((row) => row.id);
}
