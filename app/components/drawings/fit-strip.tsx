import {
  clearanceText,
  clearanceUnit,
  clearanceUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { fromCore } from "~/engineering/quantity/units";
import { Drawing } from "./drawing";
import { linearScale, niceTicks, place } from "./scale";

interface StripPosition {
  number: number;
  /** Clearances in m. */
  assembled?: number | undefined;
  tornDown?: number | undefined;
}

interface FitStripProps {
  title: string;
  units: PageUnits;
  /** All in m. */
  window: { least: number; aim: number; most: number };
  limits: { least: number; most: number };
  positions: readonly StripPosition[];
  likelyLimit?: { from: number; to: number; share: number } | undefined;
  step?: { from: number; to: number } | undefined;
}

const width = 730;
const left = 20;
const right = 710;

/**
 * A fit on one scale: its window, its hard limits, each position as built (solid) and as torn down (open) with its wear
 * between, where the limit probably lies, and the next step.
 */
export function FitStrip({ title, units, window, limits, positions, likelyLimit, step }: FitStripProps) {
  const shown = positions.filter(
    ({ assembled, tornDown }) => assembled !== undefined || tornDown !== undefined,
  );
  const values = shown.flatMap(({ assembled, tornDown }) => [
    assembled ?? window.aim,
    tornDown ?? window.aim,
  ]);
  const margin = Math.max((limits.most - limits.least) * 0.06, 1e-6);
  const from = Math.min(limits.least, ...values) - margin;
  const to = Math.max(limits.most, ...values) + margin;
  const x = linearScale(from, to, left, right);
  const unit = clearanceUnitName(units);
  const scaleFactor = 1 / fromCore(1, unit);
  const ticks = niceTicks(from / scaleFactor, to / scaleFactor, 8).map((tick) => tick * scaleFactor);

  const top = 18;
  const rowHeight = 7;
  const stepHeight = step ? 18 : 6;
  const floor = top + 10 + Math.max(4, shown.length) * rowHeight + stepHeight;
  const text = (value: number) => clearanceText(picometres(value), units);
  const band = (start: number, end: number) => ({
    x: place(x(start)),
    width: place(Math.max(0, x(end) - x(start))),
  });
  const id = title.replaceAll(/[^a-z0-9]+/gi, "-");

  return (
    <Drawing
      title={title}
      summary={summaryOf({ units, window, positions: shown, likelyLimit, step, text })}
      width={width}
      height={floor + 26}
      table={{
        head: ["position", `as built, ${clearanceUnit(units)}`, `torn down, ${clearanceUnit(units)}`],
        rows: shown.map(({ number, assembled, tornDown }) => [
          number,
          assembled === undefined ? "–" : text(assembled),
          tornDown === undefined ? "–" : text(tornDown),
        ]),
      }}
    >
      <defs>
        <pattern
          id={`${id}-hatch`}
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0V6" stroke="var(--line)" strokeWidth="2" />
        </pattern>
        <linearGradient id={`${id}-limit`}>
          <stop offset="0" stopColor="var(--stop)" stopOpacity="0" />
          <stop offset=".5" stopColor="var(--stop)" stopOpacity=".35" />
          <stop offset="1" stopColor="var(--stop)" stopOpacity="0" />
        </linearGradient>
      </defs>
      <rect {...band(from, limits.least)} y={top} height={floor - top} fill={`url(#${id}-hatch)`} />
      <rect {...band(limits.most, to)} y={top} height={floor - top} fill={`url(#${id}-hatch)`} />
      <rect {...band(window.least, window.most)} y={top} height={floor - top} fill="var(--plate-deep)" />
      {likelyLimit && (
        <g>
          <rect
            {...band(likelyLimit.from, likelyLimit.to)}
            y={top}
            height={floor - top}
            fill={`url(#${id}-limit)`}
          />
          <text
            x={Math.min(Math.max(place(x((likelyLimit.from + likelyLimit.to) / 2)), 110), 620)}
            y={12}
            textAnchor="middle"
            fontSize="11"
            fill="var(--stop)"
          >
            limit probably here, {Math.round(likelyLimit.share * 10)} in 10
          </text>
        </g>
      )}
      {shown.map(({ number, assembled, tornDown }, index) => {
        const y = top + 9 + index * rowHeight;
        return (
          <g key={number} stroke="var(--bronze)">
            {assembled !== undefined && tornDown !== undefined && (
              <path d={`M${place(x(assembled))} ${y}H${place(x(tornDown))}`} strokeWidth="1.4" />
            )}
            {assembled !== undefined && (
              <circle cx={place(x(assembled))} cy={y} r="2.6" fill="var(--bronze)" />
            )}
            {tornDown !== undefined && (
              <circle cx={place(x(tornDown))} cy={y} r="2.6" fill="var(--plate)" strokeWidth="1.3" />
            )}
          </g>
        );
      })}
      {step && <Step from={x(step.from)} to={x(step.to)} floor={floor} />}
      <path d={`M${place(x(window.aim))} ${floor}l-5 -9h10z`} fill="var(--bronze)" />
      <path d={`M${left} ${floor}H${right}`} stroke="var(--line-strong)" />
      {ticks.map((tick) => (
        <g key={tick}>
          <path d={`M${place(x(tick))} ${floor}v7`} stroke="var(--line-strong)" />
          <text
            x={place(x(tick))}
            y={floor + 20}
            textAnchor="middle"
            fontSize="11"
            fill="var(--mute)"
            className="font-mono"
          >
            {clearanceText(picometres(tick), units, -1)}
          </text>
        </g>
      ))}
    </Drawing>
  );
}

function Step({ from, to, floor }: { from: number; to: number; floor: number }) {
  const y = floor - 14;
  const back = to < from ? 8 : -8;
  return (
    <g>
      <path d={`M${place(from)} ${y}H${place(to + back)}`} stroke="var(--layout)" strokeWidth="2.5" />
      <path d={`M${place(to)} ${y}l${back} -5v10z`} fill="var(--layout)" />
      <path d={`M${place(to)} ${floor}v-10`} stroke="var(--layout)" strokeWidth="2" />
    </g>
  );
}

interface SummaryInput extends Pick<FitStripProps, "units" | "window" | "likelyLimit" | "step"> {
  positions: readonly StripPosition[];
  text: (value: number) => string;
}

function summaryOf({ units, window, positions, likelyLimit, step, text }: SummaryInput): string {
  const unit = clearanceUnit(units);
  const built = positions.flatMap(({ assembled }) => assembled ?? []);
  return [
    `Aim ${text(window.aim)} ${unit}, window ${text(window.least)} to ${text(window.most)}`,
    built.length > 0
      ? `${built.length} positions as built from ${text(Math.min(...built))} to ${text(Math.max(...built))}`
      : "no position measured yet",
    likelyLimit &&
      `${Math.round(likelyLimit.share * 10)} in 10 that the limit lies from ${text(likelyLimit.from)} to ${text(likelyLimit.to)}`,
    step && `next step from ${text(step.from)} to ${text(step.to)}`,
  ]
    .filter(Boolean)
    .join("; ")
    .concat(".");
}
