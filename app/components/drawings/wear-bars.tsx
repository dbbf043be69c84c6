import type { PageUnits } from "~/engineering/quantity/figures";
import type { PositionWearRate } from "~/engineering/wear/wear-of-clearances";
import { BottomAxis } from "./axis";
import { Drawing } from "./drawing";
import { lineWeight } from "./line-weight";
import { linearScale, place } from "./scale";
import { Figure, Words } from "./text";
import { wearText, wearTicks, wearUnit } from "./wear-axis";

interface WearBarsProps {
  title: string;
  units: PageUnits;
  bars: readonly PositionWearRate[];
}

const width = 640;
const rowHeight = 26;
const left = 40;
const right = 420;
const top = 8;

/** Wear per hour of each position with its limits; what the gauges cannot see is drawn as a bound and said so. */
export function WearBars({ title, units, bars }: WearBarsProps) {
  const most = Math.max(...bars.map(({ rate, to }) => Math.max(rate ?? 0, to ?? 0)), 1e-9);
  const x = linearScale(0, most, left, right);
  const floor = top + Math.max(1, bars.length) * rowHeight + 4;
  const unit = wearUnit(units);
  const odd = bars.find((bar) => bar.odd);
  const measurable = bars.filter((bar) => bar.measurable).length;
  return (
    <Drawing
      title={title}
      summary={`${measurable} of ${bars.length} positions wear measurably, in ${unit}${odd ? `; position ${odd.position} is the odd one out` : ""}.`}
      width={width}
      height={floor + 42}
      table={{
        head: ["position", `wear, ${unit}`, `from, ${unit}`, `to, ${unit}`, "measurable"],
        rows: bars.map((bar) => [
          bar.position,
          wearText(bar.rate, units),
          wearText(bar.from, units),
          wearText(bar.to, units),
          bar.rate === null ? "a slip" : bar.measurable ? "yes" : "no",
        ]),
      }}
    >
      {bars.map((bar, index) => (
        <WearBar key={bar.position} bar={bar} y={top + (index + 0.5) * rowHeight} x={x} units={units} />
      ))}
      <BottomAxis
        ticks={wearTicks({ from: 0, to: most }, units, 5)}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label={`wear, ${unit}, with its uncertainty`}
      />
    </Drawing>
  );
}

interface WearBarProps {
  bar: PositionWearRate;
  y: number;
  x: (rate: number) => number;
  units: PageUnits;
}

function WearBar({ bar, y, x, units }: WearBarProps) {
  const { position, rate, from, to, odd } = bar;
  const end = x(Math.max(rate ?? 0, to ?? 0));
  const isBound = rate !== null && !bar.measurable && to !== null;
  return (
    <g>
      <Figure x={left - 12} y={y + 4} anchor="end" tone={odd ? "ink" : "mute"}>
        {position}
      </Figure>
      {isBound && (
        <g strokeWidth={lineWeight.mark} className="stroke-bronze">
          <path d={`M${left} ${y}H${place(x(to))}`} strokeDasharray="3 3" />
          <path d={`M${place(x(to))} ${y - 5}v10`} />
        </g>
      )}
      {!isBound && rate !== null && rate > 0 && (
        <path
          d={`M${left} ${y - 5}H${place(x(rate))}v10H${left}z`}
          strokeWidth={lineWeight.hair}
          className={`stroke-bronze ${odd ? "fill-bronze" : "fill-bronze/35"}`}
        />
      )}
      {!isBound && from !== null && to !== null && (
        <path
          d={`M${place(x(Math.max(0, from)))} ${y}H${place(x(to))}m0 -4v8M${place(x(Math.max(0, from)))} ${y - 4}v8`}
          strokeWidth={lineWeight.mark}
          className="fill-none stroke-ink"
        />
      )}
      <Words x={end + 12} y={y + 4} tone={odd ? "watch" : "mute"}>
        {wordsOf(bar, units)}
      </Words>
    </g>
  );
}

function wordsOf({ rate, to, odd, measurable }: PositionWearRate, units: PageUnits): string {
  if (rate === null) return "closer than as built: a measuring slip";
  if (odd) return "◀ odd one out";
  return measurable ? "" : `not measurable, under ${wearText(to, units)} ${wearUnit(units)}`;
}
