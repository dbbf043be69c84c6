import type { Tick } from "./clearance-axis";
import { lineWeight } from "./line-weight";
import { place } from "./scale";
import { Figure, Words } from "./text";

interface BottomAxisProps {
  ticks: readonly Tick[];
  scale: (value: number) => number;
  from: number;
  to: number;
  /** Where the axis lies. */
  floor: number;
  /** What it shows, in which unit. */
  label?: string | undefined;
}

/** The axis below a drawing: line, ticks, figures, what it shows. */
export function BottomAxis({ ticks, scale, from, to, floor, label }: BottomAxisProps) {
  return (
    <g>
      <path
        d={`M${place(from)} ${floor}H${place(to)}${ticks.map(({ value }) => `M${place(scale(value))} ${floor}v6`).join("")}`}
        strokeWidth={lineWeight.hair}
        className="fill-none stroke-line-strong"
      />
      {ticks.map(({ value, text }) => (
        <Figure key={value} x={scale(value)} y={floor + 19} anchor="middle" size={11}>
          {text}
        </Figure>
      ))}
      {label && (
        <Words x={to} y={floor + 36} anchor="end">
          {label}
        </Words>
      )}
    </g>
  );
}

interface LeftAxisProps {
  ticks: readonly Tick[];
  scale: (value: number) => number;
  /** Where the axis stands. */
  left: number;
  right: number;
  top: number;
  floor: number;
  label?: string | undefined;
  /** Lines across the drawing at the ticks. */
  grid?: boolean;
}

/** The axis at the left of a drawing, its label above it, with lines across where they help. */
export function LeftAxis({ ticks, scale, left, right, top, floor, label, grid = true }: LeftAxisProps) {
  return (
    <g>
      {grid && (
        <path
          d={ticks.map(({ value }) => `M${left} ${place(scale(value))}H${right}`).join("")}
          strokeWidth={lineWeight.hair}
          className="stroke-line"
        />
      )}
      <path
        d={`M${left} ${top}V${floor}${ticks.map(({ value }) => `M${left} ${place(scale(value))}h-5`).join("")}`}
        strokeWidth={lineWeight.hair}
        className="fill-none stroke-line-strong"
      />
      {ticks.map(({ value, text }) => (
        <Figure key={value} x={left - 9} y={scale(value) + 4} anchor="end" size={11}>
          {text}
        </Figure>
      ))}
      {label && (
        <Words x={left} y={top - 10}>
          {label}
        </Words>
      )}
    </g>
  );
}
