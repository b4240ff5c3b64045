import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cases, caseTechnicians, images } from "@/db/schema";
import type { Actor } from "@/lib/auth/actor";
import { type CaseSubject, decide } from "@/lib/auth/policy";
import { notFound } from "@/lib/errors";
import type { PyramidShape } from "./iiif";

export type TileSource = PyramidShape & { prefix: string };

/**
 * Pyramid of a picture for somebody who may see it: those at work on the case, and its client's
 * people once it is shared with them. One indexed query, since a screen asks for many tiles.
 * @throws AppError NOT_FOUND, also while the picture is not ready
 */
export async function openTiles(actor: Actor, imageId: string): Promise<TileSource> {
  const [row] = await database()
    .select({
      widthPx: images.widthPx,
      heightPx: images.heightPx,
      prefix: images.tilePrefix,
      scaleFactors: images.scaleFactors,
      isShareable: images.isShareable,
      state: cases.state,
      number: cases.number,
      organisationId: cases.organisationId,
      requesterId: cases.requesterId,
      investigatorId: cases.investigatorId,
      leadId: cases.leadId,
      secondReaderId: cases.secondReaderId,
      isRestricted: cases.isRestricted,
      technicianId: caseTechnicians.personId,
    })
    .from(images)
    .innerJoin(cases, eq(cases.id, images.caseId))
    .leftJoin(
      caseTechnicians,
      and(eq(caseTechnicians.caseId, cases.id), eq(caseTechnicians.personId, actor.id)),
    )
    .where(eq(images.recordId, imageId));
  if (!row) throw notFound();
  // Authors and issues decide nothing about seeing, so they are not read for every tile.
  const subject: CaseSubject = {
    ...row,
    technicianIds: row.technicianId === null ? [] : [row.technicianId],
    authorIds: [],
    wasSent: row.number !== null,
    hasReleasedIssue: false,
  };
  const maySee =
    decide(actor, "case.viewWork", subject).allowed ||
    (row.isShareable && decide(actor, "case.viewFieldReturn", subject).allowed);
  const { widthPx, heightPx, prefix, scaleFactors } = row;
  if (!maySee || prefix === null || widthPx === null || heightPx === null) throw notFound();
  return { widthPx, heightPx, prefix, scaleFactors: scaleFactors ?? [1] };
}
