import { clearanceText, clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import type { PositionWearRate } from "~/engineering/wear/wear-of-clearances";
import { Drawing } from "./drawing";
import { linearScale, place } from "./scale";

interface WearBarsProps {
  title: string;
  units: PageUnits;
  bars: readonly PositionWearRate[];
}

const width = 560;
const rowHeight = 24;
const start = 34;

/** Wear per hour of each position with its limits; what the gauges cannot see is said with its bound. */
export function WearBars({ title, units, bars }: WearBarsProps) {
  const most = Math.max(...bars.map((bar) => bar.to ?? 0), 1e-9);
  const x = linearScale(0, most, start, width - 190);
  const text = (rate: number | null) =>
    rate === null ? "–" : clearanceText(picometres(rate), units, units === "inch" ? 1 : 2);
  const unit = `${clearanceUnit(units)}/h`;
  const odd = bars.find((bar) => bar.odd);
  const measurable = bars.filter((bar) => bar.measurable).length;
  return (
    <Drawing
      title={title}
      summary={`${measurable} of ${bars.length} positions wear measurably, in ${unit}${odd ? `; position ${odd.position} is the odd one out` : ""}.`}
      width={width}
      height={bars.length * rowHeight + 6}
      table={{
        head: ["position", `wear, ${unit}`, `from, ${unit}`, `to, ${unit}`, "measurable"],
        rows: bars.map((bar) => [
          bar.position,
          text(bar.rate),
          text(bar.from),
          text(bar.to),
          bar.measurable ? "yes" : "no",
        ]),
      }}
    >
      {bars.map((bar, index) => {
        const y = index * rowHeight + 12;
        return (
          <g key={bar.position} fontSize="11">
            <text x="8" y={y + 4} fill="var(--mute)" className="font-mono">
              {bar.position}
            </text>
            {bar.rate !== null && bar.rate > 0 && (
              <rect
                x={start}
                y={y - 4}
                width={place(x(bar.rate) - start)}
                height="8"
                fill="var(--bronze)"
                fillOpacity={bar.odd ? 1 : 0.55}
              />
            )}
            {bar.from !== null && bar.to !== null && (
              <path d={`M${place(x(bar.from))} ${y}H${place(x(bar.to))}`} stroke="var(--ink)" />
            )}
            <text x={place(x(bar.to ?? 0)) + 10} y={y + 4} fill={bar.odd ? "var(--watch)" : "var(--mute)"}>
              {wordOf(bar, text, unit)}
            </text>
          </g>
        );
      })}
    </Drawing>
  );
}

function wordOf(bar: PositionWearRate, text: (rate: number | null) => string, unit: string): string {
  if (bar.rate === null) return "smaller than before: a measuring slip";
  if (bar.odd) return "odd one out";
  return bar.measurable ? "" : `not measurable, under ${text(bar.to)} ${unit}`;
}
