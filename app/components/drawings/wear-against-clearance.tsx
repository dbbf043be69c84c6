import { useId } from "react";
import { clearanceText, clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { BottomAxis, LeftAxis } from "./axis";
import { BuildMarks } from "./build-marks";
import { clearanceTicks } from "./clearance-axis";
import { Drawing } from "./drawing";
import { LikelyLimit } from "./fit-strip-marks";
import { inTen } from "./fit-strip-words";
import { lineWeight } from "./line-weight";
import { linearScale, place, type Span, spanOf } from "./scale";
import { Words } from "./text";
import { wearText, wearTicks, wearUnit } from "./wear-axis";

interface WearPoint {
  build: number;
  /** Mean as built, m. */
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

const width = 640;
const left = 62;
const right = width - 14;
const top = 56;
const floor = 320;

/** Wear per hour against clearance, a build a mark: where it rises, the limit is near. */
export function WearAgainstClearance({ title, units, points, likelyLimit }: WearAgainstClearanceProps) {
  const id = useId();
  if (points.length === 0) return null;
  const clearances = spanOf(
    [...points.map(({ clearance }) => clearance), ...(likelyLimit ? [likelyLimit.from, likelyLimit.to] : [])],
    5e-6,
    0.12,
  );
  const rates = ratesSpan(points);
  const x = linearScale(clearances.from, clearances.to, left, right);
  const y = linearScale(rates.from, rates.to, floor, top);
  const unit = clearanceUnit(units);
  return (
    <Drawing
      title={title}
      summary={summaryOf(points, likelyLimit, units)}
      width={width}
      height={floor + 42}
      table={{
        head: [
          "build",
          `clearance, ${unit}`,
          `wear, ${wearUnit(units)}`,
          `sure to ±, ${wearUnit(units)}`,
          "worst grade",
        ],
        rows: points.map(({ build, clearance, rate, uncertainty, grade }) => [
          `Build ${build}`,
          clearanceText(picometres(clearance), units),
          wearText(rate, units),
          wearText(uncertainty, units),
          grade ?? "–",
        ]),
      }}
    >
      {likelyLimit && (
        <LikelyLimit
          frame={{ left, right, top: top - 12, floor, x, id }}
          from={likelyLimit.from}
          to={likelyLimit.to}
          label={`limit probably here, ${inTen(likelyLimit.share)}`}
        />
      )}
      <LeftAxis
        ticks={wearTicks(rates, units, 5)}
        scale={y}
        left={left}
        right={right}
        top={top - 12}
        floor={floor}
      />
      <Words x={0} y={12}>
        wear, {wearUnit(units)}
      </Words>
      <BottomAxis
        ticks={clearanceTicks(clearances, units, 7)}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label={`mean clearance as built at 20 °C, ${unit}`}
      />
      {rates.from < 0 && (
        <path
          d={`M${left} ${place(y(0))}H${right}`}
          strokeWidth={lineWeight.hair}
          className="stroke-line-strong"
        />
      )}
      {points.map(({ build, clearance, rate, uncertainty }) => {
        const [low, high] = [place(y(rate - uncertainty)), place(y(rate + uncertainty))];
        const middle = place(x(clearance));
        return (
          <path
            key={build}
            d={`M${middle} ${low}V${high}M${middle - 4} ${high}h8M${middle - 4} ${low}h8`}
            strokeWidth={lineWeight.mark}
            className="fill-none stroke-bronze"
          />
        );
      })}
      <BuildMarks
        clearOf={points.flatMap(({ clearance, rate, uncertainty }) =>
          [-1, -0.5, 0.5, 1].map((share) => ({ x: x(clearance), y: y(rate + share * uncertainty) })),
        )}
        builds={points.map(({ build, grade, clearance, rate }) => ({
          build,
          grade,
          x: x(clearance),
          y: y(rate),
        }))}
      />
    </Drawing>
  );
}

/** From nothing, or from below it where the truth may lie there, to a little over the most. */
function ratesSpan(points: readonly WearPoint[]): Span {
  const least = Math.min(0, ...points.map(({ rate, uncertainty }) => rate - uncertainty));
  const most = Math.max(1e-8, ...points.map(({ rate, uncertainty }) => rate + uncertainty));
  return { from: least * 1.1, to: most * 1.1 };
}

function summaryOf(
  points: readonly WearPoint[],
  likelyLimit: WearAgainstClearanceProps["likelyLimit"],
  units: PageUnits,
): string {
  const text = (value: number) => clearanceText(picometres(value), units);
  const rates = points.map(({ rate }) => rate);
  return [
    `${points.length} ${points.length === 1 ? "build" : "builds"}; wear from ${wearText(Math.min(...rates), units)} to ${wearText(Math.max(...rates), units)} ${wearUnit(units)}`,
    likelyLimit &&
      `limit probably here, ${inTen(likelyLimit.share)}: ${text(likelyLimit.from)} to ${text(likelyLimit.to)} ${clearanceUnit(units)}`,
  ]
    .filter(Boolean)
    .join("; ")
    .concat(".");
}
