import { useId } from "react";
import { clearanceText, clearanceUnit } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { BottomAxis } from "./axis";
import { clearanceTicks } from "./clearance-axis";
import { Drawing } from "./drawing";
import {
  HardLimits,
  LikelyLimit,
  OffScale,
  PositionMark,
  type StripFrame,
  StripStep,
  TargetWindow,
} from "./fit-strip-marks";
import { inTen, type StripFigures, stripSummary, stripTable } from "./fit-strip-words";
import { MarkKey } from "./mark-key";
import { linearScale, type Span } from "./scale";
import { stepWords } from "./step-words";

interface FitStripProps extends StripFigures {
  title: string;
  /** Never left: beyond them the strip is hatched. In m. */
  limits?: { least: number; most: number } | undefined;
  /** `line` stands in a row of a list and has no letters; `strip` has its scale; `full` numbers the positions. */
  size?: "line" | "strip" | "full";
}

const sizes = {
  line: { width: 300, side: 4, row: 4, radius: 2, spare: 4, step: 14 },
  strip: { width: 730, side: 22, row: 7, radius: 2.8, spare: 8, step: 24 },
  full: { width: 730, side: 22, row: 13, radius: 3.4, spare: 10, step: 24 },
} as const;

/**
 * A fit on one scale: its window, its hard limits, each position as built (solid) and as torn down (open) with its wear
 * between, where the limit probably lies, and the next step.
 */
export function FitStrip({ title, limits, size = "full", ...figures }: FitStripProps) {
  const { units, window, likelyLimit, step } = figures;
  const id = useId();
  const { width, side, row, radius, spare, step: stepHeight } = sizes[size];
  const lettered = size !== "line";
  const shown = figures.positions.filter(
    ({ assembled, tornDown }) => assembled !== undefined || tornDown !== undefined,
  );
  const span = spanOfStrip(figures, limits);

  const top = lettered && likelyLimit ? 24 : 6;
  const floor = top + spare + Math.max(3, shown.length) * row + (step ? stepHeight : 14) + spare;
  const left = side;
  const right = width - side;
  const scale = linearScale(span.from, span.to, left, right);
  const x = (value: number) => Math.min(right, Math.max(left, scale(value)));
  const frame: StripFrame = { left, right, top, floor, x, id };

  return (
    <Drawing
      title={title}
      summary={stripSummary({ ...figures, positions: shown })}
      width={width}
      height={lettered ? floor + 42 : floor + 8}
      table={lettered && shown.length > 0 ? stripTable({ ...figures, positions: shown }) : undefined}
    >
      {limits && <HardLimits frame={frame} limits={limits} />}
      <TargetWindow frame={frame} window={window} />
      {likelyLimit && (
        <LikelyLimit
          frame={frame}
          from={likelyLimit.from}
          to={likelyLimit.to}
          label={lettered ? `limit probably here, ${inTen(likelyLimit.share)}` : undefined}
        />
      )}
      {shown.map((position, index) => {
        const y = top + spare + (index + 0.5) * row;
        const away = [position.assembled, position.tornDown].find(
          (value) => value !== undefined && (value < span.from || value > span.to),
        );
        return away === undefined ? (
          <PositionMark
            key={position.number}
            frame={frame}
            position={position}
            y={y}
            radius={radius}
            numbered={size === "full"}
          />
        ) : (
          <OffScale
            key={position.number}
            frame={frame}
            y={y}
            side={away < span.from ? "left" : "right"}
            text={
              lettered
                ? `${position.number}, off this scale: ${clearanceText(picometres(away), units)}`
                : undefined
            }
          />
        );
      })}
      {step && <StripStep frame={frame} {...step} label={lettered ? stepWords(step, units) : undefined} />}
      <BottomAxis
        ticks={lettered ? clearanceTicks(span, units, 8) : []}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label={lettered ? `clearance at 20 °C, ${clearanceUnit(units)}` : undefined}
      />
      {lettered && <MarkKey x={left} y={floor + 36} marks={["built", "torn", "aim"]} />}
    </Drawing>
  );
}

/**
 * The hard limits with some air, or the window with as much again on both sides, and every clearance that is not far
 * beyond them: one slip of the hand must not squeeze the others together.
 */
function spanOfStrip(
  { window, positions, likelyLimit, step }: StripFigures,
  limits: FitStripProps["limits"],
): Span {
  const half = Math.max(window.most - window.least, 2e-6);
  const ends = [limits?.least ?? window.least - half, limits?.most ?? window.most + half];
  const least = Math.min(...ends);
  const most = Math.max(...ends);
  const reach = Math.max(most - least, 2e-6) * 0.5;
  const values = [
    least,
    most,
    window.least,
    window.most,
    ...(likelyLimit ? [likelyLimit.from, likelyLimit.to] : []),
    ...(step ? [step.from, step.to] : []),
    ...positions.flatMap(({ assembled, tornDown }) => [assembled ?? window.aim, tornDown ?? window.aim]),
  ].filter((value) => value >= least - reach && value <= most + reach);
  const from = Math.min(...values);
  const to = Math.max(...values);
  const air = (to - from) * 0.07;
  return { from: from - air, to: to + air };
}
