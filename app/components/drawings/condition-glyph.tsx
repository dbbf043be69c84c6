import { conditionGrades } from "~/engineering/trade/condition";
import { place } from "./scale";

/** How many pieces the shell's face is broken into at each grade: one is whole. */
const pieces = [1, 1, 2, 3, 4] as const;

const colours = ["var(--ok)", "var(--ok)", "var(--watch)", "var(--stop)", "var(--stop)"] as const;

/** An arc of the lower half circle between two shares of it, 0 at its right end. */
function arc(x: number, y: number, radius: number, from: number, to: number): string {
  const point = (share: number) => {
    const angle = Math.PI * share;
    return `${place(x + radius * Math.cos(angle))} ${place(y + radius * Math.sin(angle))}`;
  };
  return `M${point(from)}A${radius} ${radius} 0 0 1 ${point(to)}`;
}

interface GlyphShapeProps {
  grade: number;
  x: number;
  y: number;
  radius: number;
}

/** The glyph inside another drawing: a half shell, more of its face broken at each grade, the number inside. */
export function GlyphShape({ grade, x, y, radius }: GlyphShapeProps) {
  const count = pieces[grade] ?? 4;
  const gap = count === 1 ? 0 : 0.05 + 0.03 * count;
  const length = (1 - gap * (count - 1)) / count;
  return (
    <g>
      {Array.from({ length: count }, (_, index) => index * (length + gap)).map((from) => (
        <path
          key={from}
          d={arc(x, y, radius, from, from + length)}
          fill="none"
          stroke={colours[grade]}
          strokeWidth={radius / 3}
        />
      ))}
      {grade === 0 && (
        <path
          d={arc(x, y, radius * 0.62, 0.1, 0.9)}
          fill="none"
          stroke={colours[0]}
          strokeWidth={radius / 9}
        />
      )}
      <text
        x={x}
        y={y + radius * 0.25}
        textAnchor="middle"
        fontSize={radius}
        fill="var(--ink)"
        className="font-mono"
      >
        {grade}
      </text>
    </g>
  );
}

/** The condition of a part by itself, in a line of text. */
export function ConditionGlyph({ grade, size = 28 }: { grade: number; size?: number }) {
  return (
    <svg
      className="shrink-0"
      role="img"
      aria-label={`grade ${grade}, ${conditionGrades[grade]}`}
      width={size}
      height={size * 0.8}
      viewBox="0 0 28 22"
    >
      <GlyphShape grade={grade} x={14} y={8} radius={10} />
    </svg>
  );
}
