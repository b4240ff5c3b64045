import type { BenchScale } from "@/lib/images/bench-state";
import { formatDate } from "@/lib/format/dates";
import { formatQuantity } from "@/lib/format/numbers";
import { tiltShortfall } from "@/lib/imaging/uncertainty";
import { BENCH_LINK, BENCH_PANEL } from "./bench-look";

type Props = { scale: BenchScale | null; mayScale: boolean; onScale: () => void };

function tiltText(tiltDeg: number | null): string {
  if (tiltDeg === null) return "not stated, not corrected";
  if (tiltDeg === 0) return "0°";
  const short = formatQuantity(100 * tiltShortfall(tiltDeg), "%", { figures: 2 });
  return `${tiltDeg}°, not corrected: lengths across it read ${short} short`;
}

/** Where the scale is from, how sure it is, who set it and when. */
export function ScalePanel({ scale, mayScale, onScale }: Props) {
  const settings = scale?.content.settings;
  const facts: [string, string][] =
    scale && settings
      ? [
          [
            "From",
            settings.source === "two_points"
              ? `${settings.standard} ${scale.label}, ${settings.knownDistanceMm} mm`
              : "The file's own resolution",
          ],
          ["Pixel", scale.pixelText],
          ["Set by", `${scale.by}, ${formatDate(scale.at)}`],
          ["Tilt", tiltText(settings.tiltDeg)],
        ]
      : [];
  return (
    <section aria-label="Calibration" className={`${BENCH_PANEL} px-3.5 py-3 text-12`}>
      <header className="flex items-center justify-between">
        <h2 className="text-13 font-head">Calibration</h2>
        {mayScale && (
          <button type="button" className={BENCH_LINK} onClick={onScale}>
            {scale ? "Set it again" : "Set the scale"}
          </button>
        )}
      </header>
      {scale ? (
        <dl className="mt-1 grid grid-cols-[4rem_minmax(0,1fr)] gap-y-1">
          {facts.map(([name, value]) => (
            <div key={name} className="contents">
              <dt className="text-ib-ink-2">{name}</dt>
              <dd className="raw">{value}</dd>
            </div>
          ))}
        </dl>
      ) : (
        <p className="mt-1 text-ib-origin">
          ▲ Not calibrated. No length is given until the scale is set.
        </p>
      )}
    </section>
  );
}
