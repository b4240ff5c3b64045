import { describe, expect, it } from "vitest";
import { parseBlock, type ParsedBlock } from "@/lib/hardness/parse-block";

function read(text: string) {
  const block = parseBlock(text);
  if (block.status === "refused") throw new Error(block.reason);
  return block;
}
const refusal = (block: ParsedBlock) => (block.status === "refused" ? block.code : null);
const problemCodes = (text: string) =>
  read(text).rows.map(({ problems }) => problems.map(({ cell, code }) => `${cell}:${code}`));

describe("a pasted block", () => {
  it("reads tabs and decimal commas, and says what it read", () => {
    const block = read("0,30\t54,2\t54,6\r\n0,50\t53,6\t53,0\r\n");
    expect(block).toMatchObject({
      columns: "depth_diagonals",
      separator: "tab",
      summary: "2 rows, 3 columns; decimal commas read as points",
    });
    expect(block.rows[0]).toMatchObject({
      line: 1,
      depthMm: 0.3,
      d1Um: 54.2,
      d2Um: 54.6,
      hardness: null,
    });
  });

  it("reads semicolons with decimal commas, and depth with hardness", () => {
    const block = read("0,3;627\n0,5;653");
    expect(block).toMatchObject({ columns: "depth_hardness", separator: "semicolon" });
    expect(block.rows.map(({ depthMm, hardness }) => [depthMm, hardness])).toEqual([
      [0.3, 627],
      [0.5, 653],
    ]);
  });

  it("reads commas as column marks where points mark the decimals or a space follows", () => {
    expect(read("0.30,54.2,54.6\n0.50,53.6,53").separator).toBe("comma");
    expect(read("1, 627\n2, 600").rows[1]).toMatchObject({ depthMm: 2, hardness: 600 });
    expect(read("0.30,627").summary).toBe("1 row, 2 columns; commas read as column marks");
  });

  it("reads decimal commas between spaces", () => {
    expect(read("0,30  627\n0,50  653").rows[0]).toMatchObject({ depthMm: 0.3, hardness: 627 });
  });

  it("does not guess at commas that could be either", () => {
    expect(refusal(parseBlock("0,30,627\n0,50,653"))).toBe("unclear_commas");
    expect(read("1,627\n2,600").rows[0]).toMatchObject({ depthMm: 1, hardness: 627 });
  });

  it("takes a first line of words as header, and a note behind the numbers", () => {
    const block = read("Depth\tHV1\tNote\n0.3\t627\tsoft, near scratch\n0.5\t653\t");
    expect(block).toMatchObject({
      header: ["Depth", "HV1", "Note"],
      columns: "depth_hardness",
      hasNotes: true,
    });
    expect(block.rows.map(({ line, note }) => [line, note])).toEqual([
      [2, "soft, near scratch"],
      [3, null],
    ]);
    expect(block.summary).toBe("2 rows, 3 columns; first line read as header");
  });

  it("does not read a header's micrometres as millimetres", () => {
    expect(refusal(parseBlock("Depth µm\tHV1\n300\t627"))).toBe("depth_not_in_mm");
  });

  it("keeps the text of a cell that it cannot read, and the rest of its row", () => {
    const [row] = read("0.30\tabout 54\t54.6\n0.5\t53\t53").rows;
    expect(row).toMatchObject({ depthMm: 0.3, d1Um: null, d2Um: 54.6 });
    expect(row?.cells).toEqual(["0.30", "about 54", "54.6"]);
    expect(row?.problems).toEqual([
      { cell: "d1", code: "words", text: "“about 54” is not a number." },
    ]);
  });

  it.each([
    ["0.3\tNaN", ["hardness:not_a_number"]],
    ["0.3\tInfinity", ["hardness:not_a_number"]],
    ["0.3\t#DIV/0!", ["hardness:not_a_number"]],
    ["0.3\t1e999", ["hardness:not_a_number"]],
    ["-0.3\t600", ["depth:negative_depth"]],
    ["\u22120,3\t600", ["depth:negative_depth"]],
    ["0.3\t0", ["hardness:not_positive"]],
    ["0.3\t-600", ["hardness:not_positive"]],
    ["0.3\t600 610", ["hardness:two_numbers"]],
    ["0.3\t600/610", ["hardness:two_numbers"]],
    ["0.3\t1.234,5", ["hardness:unclear_number"]],
    ["\t600", ["depth:missing"]],
    ["0.3\t600 HV", ["hardness:words"]],
    ["0.3\t1\u202f234,5", []],
  ])("reads %j with problems %j", (text, problems) => {
    expect(problemCodes(text)).toEqual([problems]);
  });

  it("names the line on which a depth was before", () => {
    const block = read("0.3\t600\n0.5\t590\n0,30\t580");
    expect(block.rows[2]?.problems[0]).toMatchObject({ code: "duplicate_depth" });
    expect(block.rows[2]?.problems[0]?.text).toContain("line 1 too");
    expect(block.rows[2]?.depthMm).toBe(0.3);
    expect(block.summary).toContain("1 row to look at");
  });

  it("reads words in a first line beside numbers as a row, not as a header", () => {
    expect(read("deep\t600\n0.5\t590").rows).toHaveLength(2);
  });

  it("says what it cannot use", () => {
    expect(refusal(parseBlock(" \n \n"))).toBe("empty");
    expect(refusal(parseBlock("Depth\tHV1\n"))).toBe("empty");
    expect(refusal(parseBlock("0.3\n0.5"))).toBe("column_count");
    expect(refusal(parseBlock("1\t2\t3\t4\t5"))).toBe("column_count");
  });

  it("takes ten thousand rows and refuses one more", () => {
    const rows = Array.from(
      { length: 10_001 },
      (_, index) => `${index / 1000}\t${700 - index / 100}`,
    );
    expect(read(rows.slice(1).join("\n")).rows).toHaveLength(10_000);
    expect(refusal(parseBlock(rows.join("\n")))).toBe("too_many_rows");
  });
});
