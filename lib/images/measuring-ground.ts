import "server-only";
import type { MeasuringGround } from "./measure-mark";
import type { MarkContent } from "./mark-schemas";
import { numberOf, type PictureMarks, type StoredMark } from "./picture-marks";

type Ground = { ground: MeasuringGround; inputs: string[] };
type Described = Pick<MarkContent, "geometry" | "originId">;

/** The live section outline of a picture. */
export function outlineOf(state: PictureMarks): StoredMark | null {
  return (
    state.marks.find(
      ({ isVoid, content: { geometry } }) =>
        !isVoid && geometry.tool === "area" && geometry.isOutline === true,
    ) ?? null
  );
}

/** The origin a front is measured from: the one it names, else the first on the picture. */
export function originFor(state: PictureMarks, originId: string | null): StoredMark | null {
  const origins = state.marks
    .filter((mark) => !mark.isVoid && mark.content.tool === "origin")
    .sort((a, b) => numberOf(a.label) - numberOf(b.label));
  return origins.find((mark) => mark.id === originId) ?? origins[0] ?? null;
}

/** What a mark is measured against, and the versions that its values then rest on. */
export function groundFor(state: PictureMarks, { geometry, originId }: Described): Ground {
  const { tool } = geometry;
  const isOutline = geometry.tool === "area" && geometry.isOutline === true;
  const takesScale = tool === "front" || tool === "area" || tool === "length";
  const takesOutline = tool === "origin" || tool === "ratchet" || (tool === "area" && !isOutline);
  const scale = takesScale ? state.scale : null;
  const outline = takesOutline ? outlineOf(state) : null;
  const origin = tool === "front" ? originFor(state, originId) : null;
  return {
    ground: {
      scale: scale && { ...scale.content, label: scale.label },
      outline:
        outline?.content.geometry.tool === "area"
          ? { label: outline.label, points: outline.content.geometry.points }
          : null,
      origin:
        origin?.content.geometry.tool === "origin"
          ? { label: origin.label, point: origin.content.geometry.point }
          : null,
    },
    inputs: [scale, outline, origin].flatMap((input) => (input ? [input.versionId] : [])).sort(),
  };
}
