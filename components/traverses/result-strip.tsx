import { classNames } from "@/components/ui/class-names";
import { formatHardness } from "@/lib/format/hardness";
import { formatNumber, formatWithUncertainty } from "@/lib/format/numbers";
import type { RequirementVerdict } from "@/lib/hardness/requirement";
import { convertedText } from "@/lib/traverses/result-quotes";
import type { ResultContent } from "@/lib/traverses/schemas";

const VERDICT_WORDS: Record<RequirementVerdict["word"], string> = {
  pass: "Met.",
  fail: "Not met.",
  cannot_be_decided: "Cannot be decided.",
};

function Verdict({ of }: { of: RequirementVerdict | null }) {
  if (!of) return null;
  const tone = of.word === "fail" ? "text-bad" : of.word === "pass" ? "text-ink-2" : "text-warn";
  const isScale = of.word === "cannot_be_decided" && of.reason.includes("measured in");
  return (
    <span className={classNames("block", tone)}>
      {of.reason} {isScale ? "Cannot be decided from a converted value." : VERDICT_WORDS[of.word]}
      {of.isWithinUncertainty ? " Within the uncertainty of the limit." : ""}
    </span>
  );
}

/** "mean of 2 to 5", or the indents one by one. */
function whichOf(ids: readonly string[], result: ResultContent): string {
  const numbers = result.readings.filter(({ id }) => ids.includes(id)).map(({ number }) => number);
  const [first] = numbers;
  const last = numbers.at(-1);
  if (first === undefined || last === undefined) return "";
  if (numbers.length === 1) return `indent ${first}`;
  const isRun = last - first === numbers.length - 1;
  return `mean of ${isRun ? `${first} to ${last}` : numbers.join(", ")}`;
}

function Cell({
  name,
  value,
  children,
}: {
  name: string;
  value: string;
  children?: React.ReactNode;
}) {
  return (
    <div className="border-b border-rule px-3.5 py-2.5 last:border-0 sm:border-r sm:border-b-0">
      <dt className="text-12 text-ink-3">{name}</dt>
      <dd>
        <span className="tn block text-16 leading-6 font-head">{value}</span>
        <span className="block text-12 text-ink-2">{children}</span>
      </dd>
    </div>
  );
}

function Hardness({
  name,
  of,
  result,
}: {
  name: string;
  of: ResultContent["surface"];
  result: ResultContent;
}) {
  const which = whichOf(of.readingIds, result);
  const converted = of.conversions.flatMap((conversion) => convertedText(conversion) ?? []);
  return (
    <Cell
      name={which ? `${name}, ${which}` : name}
      value={formatHardness({
        value: of.value,
        scale: result.symbol,
        uncertainty: of.expandedUncertainty,
      })}
    >
      {converted.length > 0 ? `${converted.join(", ")}. ` : null}
      {of.remark ? <span className="block">{of.remark}</span> : null}
      <Verdict of={of.requirement} />
    </Cell>
  );
}

/** Depth, surface and core at a glance, each with its requirement. */
export function ResultStrip({ result }: { result: ResultContent }) {
  const { depth, symbol } = result;
  const limit =
    depth && depth.limit !== null
      ? ` at limit ${formatNumber(depth.limit, { decimals: 0 })} ${symbol}`
      : "";
  return (
    <section aria-label="Results">
      <dl className="grid rounded-4 border border-rule-2 bg-surface sm:grid-cols-3">
        {depth ? (
          <Cell
            name={`${depth.kind}${limit}`}
            value={formatWithUncertainty(depth.depthMm, depth.expandedUncertaintyMm, "mm", {
              decimals: 2,
            })}
          >
            {depth.reason}
            <Verdict of={depth.requirement} />
          </Cell>
        ) : (
          <Cell name="Case depth" value="–">
            No depth is asked of this traverse.
          </Cell>
        )}
        <Hardness name="Surface" of={result.surface} result={result} />
        <Hardness name="Core" of={result.core} result={result} />
      </dl>
    </section>
  );
}

/** What the numbers are made of and what they do not replace. */
export function ResultCautions({ result }: { result: ResultContent }) {
  const { depth, hasConversions, tableTitles } = result;
  return (
    <p className="text-12 text-ink-3">
      {hasConversions
        ? `Converted by ${tableTitles.join(", ")}. Converted hardness and strength do not replace the specified test. `
        : ""}
      {depth ? `Uncertainty of depth: ${depth.uncertaintyStatement}` : ""}
    </p>
  );
}
