import "server-only";
import type { ReportCaution } from "./model";

/**
 * What every findings report says about its own reach. The first five are safety cautions; the
 * others are the statements that ISO/IEC 17025:2017, 7.8.2 asks for or suggests, in own words.
 */
export const STANDARD_CAUTIONS: readonly ReportCaution[] = [
  {
    text: "These findings rest on the pieces examined. Do not return the part, a sister part or a fleet to service on them alone; that decision belongs to the responsible engineer and to the rules that apply.",
    onFirstPage: true,
  },
  {
    text: "This report does not release anything as fit for service, for flight, under pressure or as a structure. Where the law asks for a licensed or chartered engineer, only that person may approve.",
  },
  {
    text: "Computed strength, life and critical crack size are estimates within the limits stated with them. Do not lengthen an inspection interval on the strength of a computed value alone.",
  },
  {
    text: "A hardness or strength that was converted from another scale does not replace the test that a requirement names, and decides no requirement stated in that scale.",
  },
  {
    text: "This is a technical opinion. It assigns no blame and states no finding of law.",
  },
  {
    text: "The results relate only to the items tested, in the condition in which they were received.",
  },
  {
    text: "Facts marked as supplied were given by the client and have not been verified; they can affect the conclusions.",
  },
  {
    text: "The opinions are those of the people who signed, on the evidence available on the date of signature, and may be revised on new evidence.",
  },
  { text: "Reproduce this report only in full, unless the laboratory agrees in writing." },
];
