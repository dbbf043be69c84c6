import {
  clearanceText,
  clearanceUnit,
  clearanceUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { fromCore } from "~/engineering/quantity/units";
import { GlyphShape } from "./condition-glyph";
import { Drawing } from "./drawing";
import { linearScale, niceTicks, place } from "./scale";

interface WearPoint {
  build: number;
  /** Clearance as built, m. */
  clearance: number;
  /** Wear per hour, m/h, and how far either side of it the truth may lie. */
  rate: number;
  uncertainty: number;
  grade?: number | undefined;
}

interface WearAgainstClearanceProps {
  title: string;
  units: PageUnits;
  points: readonly WearPoint[];
  likelyLimit?: { from: number; to: number; share: number } | undefined;
}

const width = 560;
const height = 300;
const left = 66;
const right = width - 14;
const top = 34;
const floor = height - 42;

/** Wear per hour against the clearance it ran at, one point a build: where it starts to rise, the limit is near. */
export function WearAgainstClearance({ title, units, points, likelyLimit }: WearAgainstClearanceProps) {
  if (points.length === 0) return null;
  const clearances = points.map(({ clearance }) => clearance);
  if (likelyLimit) clearances.push(likelyLimit.from, likelyLimit.to);
  const margin = Math.max((Math.max(...clearances) - Math.min(...clearances)) * 0.1, 2e-6);
  const least = Math.min(...clearances) - margin;
  const most = Math.max(...clearances) + margin;
  const lowest = Math.min(0, ...points.map(({ rate, uncertainty }) => rate - uncertainty));
  const highest = Math.max(1e-8, ...points.map(({ rate, uncertainty }) => rate + uncertainty)) * 1.08;
  const x = linearScale(least, most, left, right);
  const y = linearScale(lowest, highest, floor, top);
  const metresPerUnit = 1 / fromCore(1, clearanceUnitName(units));
  const ticks = (from: number, to: number, count: number) =>
    niceTicks(from / metresPerUnit, to / metresPerUnit, count).map((tick) => tick * metresPerUnit);
  const clearance = (value: number) => clearanceText(picometres(value), units);
  const rate = (value: number) => clearanceText(picometres(value), units, units === "inch" ? 1 : 2);
  const unit = clearanceUnit(units);
  const limitWords = likelyLimit && `limit probably here, ${Math.round(likelyLimit.share * 10)} in 10`;
  const gradient = `${title.replaceAll(/[^a-z0-9]+/gi, "-")}-limit`;
  const rates = points.map((point) => point.rate);

  return (
    <Drawing
      title={title}
      summary={[
        `${points.length} ${points.length === 1 ? "build" : "builds"}; wear from ${rate(Math.min(...rates))} to ${rate(Math.max(...rates))} ${unit}/h`,
        likelyLimit &&
          `${limitWords}: ${clearance(likelyLimit.from)} to ${clearance(likelyLimit.to)} ${unit}`,
      ]
        .filter(Boolean)
        .join("; ")
        .concat(".")}
      width={width}
      height={height}
      table={{
        head: ["build", `clearance, ${unit}`, `wear, ${unit}/h`, `sure to ±, ${unit}/h`, "worst grade"],
        rows: points.map((point) => [
          `Build ${point.build}`,
          clearance(point.clearance),
          rate(point.rate),
          rate(point.uncertainty),
          point.grade ?? "–",
        ]),
      }}
    >
      {likelyLimit && (
        <g>
          <linearGradient id={gradient}>
            <stop offset="0" stopColor="var(--stop)" stopOpacity="0" />
            <stop offset=".5" stopColor="var(--stop)" stopOpacity=".35" />
            <stop offset="1" stopColor="var(--stop)" stopOpacity="0" />
          </linearGradient>
          <rect
            x={place(x(likelyLimit.from))}
            width={place(Math.max(0, x(likelyLimit.to) - x(likelyLimit.from)))}
            y={top}
            height={floor - top}
            fill={`url(#${gradient})`}
          />
          <text
            x={Math.min(Math.max(place(x((likelyLimit.from + likelyLimit.to) / 2)), left + 72), right - 72)}
            y={top - 6}
            textAnchor="middle"
            fontSize="11"
            fill="var(--stop)"
          >
            {limitWords}
          </text>
        </g>
      )}
      {ticks(lowest, highest, 5).map((tick) => (
        <g key={tick}>
          <path d={`M${left} ${place(y(tick))}H${right}`} stroke="var(--line)" />
          <text
            x={left - 8}
            y={place(y(tick)) + 4}
            textAnchor="end"
            fontSize="11"
            fill="var(--mute)"
            className="font-mono"
          >
            {rate(tick)}
          </text>
        </g>
      ))}
      {ticks(least, most, 6).map((tick) => (
        <g key={tick}>
          <path d={`M${place(x(tick))} ${floor}v6`} stroke="var(--line-strong)" />
          <text
            x={place(x(tick))}
            y={floor + 19}
            textAnchor="middle"
            fontSize="11"
            fill="var(--mute)"
            className="font-mono"
          >
            {clearanceText(picometres(tick), units, -1)}
          </text>
        </g>
      ))}
      <path d={`M${left} ${top}V${floor}H${right}`} fill="none" stroke="var(--line-strong)" />
      {points.map((point) => (
        <Point
          key={point.build}
          point={point}
          x={place(x(point.clearance))}
          y={place(y(point.rate))}
          from={place(y(point.rate - point.uncertainty))}
          to={place(y(point.rate + point.uncertainty))}
        />
      ))}
      <text x={0} y={12} fontSize="11" fill="var(--mute)">
        wear, {unit}/h
      </text>
      <text x={right} y={height - 4} textAnchor="end" fontSize="11" fill="var(--mute)">
        clearance as built, {unit}
      </text>
    </Drawing>
  );
}

interface PointProps {
  point: WearPoint;
  x: number;
  y: number;
  from: number;
  to: number;
}

/** One build: its uncertainty as a bar with ends, its number beside, its worst grade where it was graded. */
function Point({ point, x, y, from, to }: PointProps) {
  return (
    <g>
      <path
        d={`M${x} ${from}V${to}M${x - 4} ${from}h8M${x - 4} ${to}h8`}
        fill="none"
        stroke="var(--line-strong)"
        strokeWidth="1.3"
      />
      {point.grade === undefined ? (
        <circle cx={x} cy={y} r="3.2" fill="var(--bronze)" />
      ) : (
        <g>
          <circle cx={x} cy={y} r="9" fill="var(--plate)" />
          <GlyphShape grade={point.grade} x={x} y={y} radius={8} />
        </g>
      )}
      <text x={x + 13} y={y + 4} fontSize="10" fill="var(--mute)">
        build {point.build}
      </text>
    </g>
  );
}
