import { formatQuantity } from "@/lib/format/numbers";
import { scaleBar, scaleBarUnit } from "@/lib/imaging/scale-bar";

/** The scale bar of the bench, redrawn at every zoom. */
export function ScaleBarMark({ umPerScreenPx }: { umPerScreenPx: number }) {
  const bar = scaleBar(umPerScreenPx);
  if (!bar) return null;
  const { value, unit } = scaleBarUnit(bar.lengthUm);
  const text = formatQuantity(value, unit);
  const width = bar.widthPx;
  return (
    <svg
      width={width + 16}
      height="34"
      role="img"
      aria-label={`Scale bar ${text}`}
      className="block"
    >
      <rect width={width + 16} height="34" fill="#000" fillOpacity=".72" />
      <path
        d={`M8 24h${width}M8 18v12M${8 + width} 18v12M${8 + width / 2} 21v6`}
        stroke="#fff"
        strokeWidth="1.8"
      />
      <text
        x={8 + width / 2}
        y="14"
        textAnchor="middle"
        fontSize="12.5"
        fontWeight="550"
        fill="#fff"
        className="tn"
      >
        {text}
      </text>
    </svg>
  );
}
