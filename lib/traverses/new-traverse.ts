import { DEPTH_KINDS } from "@/lib/hardness/depth-limits";
import { NO_PROPOSAL, type TraverseProposal } from "./propose-from-return";
import type { TraverseContent } from "./schemas";

/** Standard uncertainty of a mean diagonal and of an indent's place, common practice on a bench. */
const DIAGONAL_UNCERTAINTY_UM = 0.4;
const POSITION_UNCERTAINTY_MM = 0.025;

/** A traverse without readings, set up as the field return asks. */
export function newTraverse(proposal: TraverseProposal = NO_PROPOSAL): TraverseContent {
  return {
    name: "",
    itemId: null,
    method: "vickers",
    loadKgf: proposal.depthKind === "none" ? 1 : DEPTH_KINDS[proposal.depthKind].loadKgf,
    spacingClass: "steel_copper",
    edgeReference: "surface",
    sectionAngleDeg: null,
    materialGroup: "steel-unalloyed-lowalloy",
    tableId: null,
    depthKindReason: "",
    agreedLimit: null,
    coreHv: null,
    diagonalUncertaintyUm: DIAGONAL_UNCERTAINTY_UM,
    positionUncertaintyMm: POSITION_UNCERTAINTY_MM,
    tracks: "each",
    surfaceReadingIds: [],
    coreReadingIds: [],
    readings: [],
    ...proposal,
  };
}
