import type { Chart, Primitive, Stroke } from "@/lib/charts/primitives";
import { px, shapeOf } from "@/lib/charts/shapes";

/** Draws a chart in the colours of the current theme. Works on the server and in the browser. */
export function SvgChart({ chart, className }: { chart: Chart; className?: string }) {
  return (
    <svg
      role="img"
      aria-label={`${chart.title}. ${chart.description}`}
      viewBox={`0 0 ${px(chart.widthPx)} ${px(chart.heightPx)}`}
      width={chart.widthPx}
      height={chart.heightPx}
      className={className}
      style={{
        display: "block",
        maxWidth: "100%",
        height: "auto",
        fontFamily: "var(--sans)",
        fontVariantNumeric: "tabular-nums",
      }}
    >
      <title>{chart.title}</title>
      <desc>{chart.description}</desc>
      {chart.primitives.map((primitive, index) => (
        <Mark key={index} primitive={primitive} />
      ))}
    </svg>
  );
}

function Mark({ primitive }: { primitive: Primitive }) {
  if (primitive.kind === "text") {
    const { x, y, rotateDeg } = primitive;
    return (
      <text
        x={px(x)}
        y={px(y)}
        fill={`var(--${primitive.token})`}
        fontSize={primitive.sizePx}
        fontWeight={primitive.weight}
        textAnchor={primitive.anchor}
        transform={rotateDeg ? `rotate(${rotateDeg} ${px(x)} ${px(y)})` : undefined}
      >
        {primitive.text}
      </text>
    );
  }
  const shape = shapeOf(primitive);
  return (
    <path
      d={shape.d}
      fill={shape.fill ? `var(--${shape.fill})` : "none"}
      opacity={shape.opacity}
      {...strokeProps(shape.stroke)}
    />
  );
}

function strokeProps(stroke: Stroke | undefined) {
  if (!stroke) return {};
  return {
    stroke: `var(--${stroke.token})`,
    strokeWidth: stroke.widthPx,
    strokeDasharray: stroke.dashPx?.join(" "),
  };
}
