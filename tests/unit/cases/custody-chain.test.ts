import { describe, expect, it } from "vitest";
import { custodyBreaks } from "@/lib/evidence/custody-chain";

const at = (hour: number) => new Date(Date.UTC(2026, 10, 18, hour));
const entry = (
  position: number,
  fromPlace: string,
  toPlace: string,
  hour: number,
  act = "handed_over",
) => ({
  position,
  act,
  at: at(hour),
  fromPlace,
  toPlace,
});

// Continuity of custody: ASTM E1492 minimum record (from memory); the rule itself is common practice.
describe("custodyBreaks", () => {
  it("finds nothing in a whole chain, in whatever order it comes", () => {
    expect(custodyBreaks([entry(2, "Store", "Bench", 10), entry(1, "Client", "Store", 9)])).toEqual(
      [],
    );
  });
  it("names a place that does not follow", () => {
    expect(
      custodyBreaks([entry(1, "Client", "Store", 9), entry(2, "Saw room", "Bench", 10)]),
    ).toEqual(["left Store, taken up at Saw room"]);
  });
  it("names time that runs backwards", () => {
    expect(custodyBreaks([entry(1, "Client", "Store", 9), entry(2, "Store", "Bench", 8)])).toEqual([
      "entry 2 is earlier than the one before",
    ]);
  });
  it("leaves corrections out of the chain of places", () => {
    expect(
      custodyBreaks([
        entry(1, "Client", "Store", 9),
        entry(2, "Store", "Store", 12, "correction"),
        entry(3, "Store", "Bench", 10),
      ]),
    ).toEqual([]);
  });
});
