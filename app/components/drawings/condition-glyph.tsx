import { conditionGrades } from "~/engineering/trade/condition";
import { place } from "./scale";

/**
 * The face of the shell at each grade, as shares of its arc from right to left that still stand, and how far each piece
 * has come out of its place, in radii.
 */
const faces: readonly (readonly { from: number; to: number; out: number }[])[] = [
  [{ from: 0, to: 1, out: 0 }],
  [{ from: 0, to: 1, out: 0 }],
  [
    { from: 0, to: 0.43, out: 0 },
    { from: 0.57, to: 1, out: 0 },
  ],
  [
    { from: 0, to: 0.24, out: 0 },
    { from: 0.39, to: 0.61, out: 0 },
    { from: 0.76, to: 1, out: 0 },
  ],
  [
    { from: 0, to: 0.14, out: 0 },
    { from: 0.29, to: 0.42, out: 0.16 },
    { from: 0.58, to: 0.71, out: -0.12 },
    { from: 0.86, to: 1, out: 0.1 },
  ],
];

const colours = ["stroke-ok", "stroke-ok", "stroke-watch", "stroke-stop", "stroke-stop"] as const;

interface GlyphShapeProps {
  grade: number;
  x: number;
  y: number;
  radius: number;
}

/**
 * The glyph inside another drawing: a half shell, more of its face broken at each grade, the number inside. A shell as
 * new is bare; one with a normal polish has the line of it.
 */
export function GlyphShape({ grade, x, y, radius }: GlyphShapeProps) {
  const face = faces[grade] ?? faces[4]!;
  const pieces = face.map(({ from, to, out }) => arc({ x, y, radius: radius * (1 + out), from, to }));
  return (
    <g>
      <path d={pieces.join("")} strokeWidth={radius * 0.62} className="fill-none stroke-plate" />
      <circle cx={place(x)} cy={place(y)} r={place(radius * 0.7)} className="fill-plate" />
      <path d={pieces.join("")} strokeWidth={place(radius / 3)} className={`fill-none ${colours[grade]}`} />
      {grade === 1 && (
        <path
          d={arc({ x, y, radius: radius * 0.66, from: 0.12, to: 0.88 })}
          strokeWidth={place(radius / 10)}
          className={`fill-none ${colours[1]}`}
        />
      )}
      <text
        x={place(x)}
        y={place(y + radius * 0.22)}
        textAnchor="middle"
        fontSize={radius * 1.05}
        className="fill-ink font-mono font-medium"
      >
        {grade}
      </text>
    </g>
  );
}

/** An arc of the lower half circle between two shares of it, 0 at its right end. */
function arc({ x, y, radius, from, to }: { x: number; y: number; radius: number; from: number; to: number }) {
  const point = (share: number) => {
    const angle = Math.PI * share;
    return `${place(x + radius * Math.cos(angle))} ${place(y + radius * Math.sin(angle))}`;
  };
  const size = Math.round(radius * 100) / 100;
  return `M${point(from)}A${size} ${size} 0 0 1 ${point(to)}`;
}

interface ConditionGlyphProps {
  /** 0 as new, 1 normal polish, 2 marked, 3 distressed, 4 failed. */
  grade: number;
  /** Width in pixels. */
  size?: number;
  /** Writes the grade's word beside it, where there is room. */
  word?: boolean;
}

/** The condition of a part by itself, in a line of text. */
export function ConditionGlyph({ grade, size = 28, word = false }: ConditionGlyphProps) {
  const name = conditionGrades[grade] ?? "no such grade";
  return (
    <span className="inline-flex items-center gap-1.5 align-middle">
      <svg
        role="img"
        aria-label={word ? `grade ${grade}` : `grade ${grade}, ${name}`}
        width={size}
        height={Math.round(size * 0.86)}
        viewBox="0 0 28 24"
        className="shrink-0"
      >
        <GlyphShape grade={grade} x={14} y={9} radius={11} />
      </svg>
      {word && name}
    </span>
  );
}
