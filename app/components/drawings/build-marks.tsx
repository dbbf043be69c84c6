import { GlyphShape } from "./condition-glyph";
import { besideEach } from "./keep-apart";
import { lineWeight } from "./line-weight";
import { pathThrough, place } from "./scale";
import { Figure } from "./text";

interface BuildMark {
  build: number;
  grade?: number | undefined;
  /** In the drawing's own pixels. */
  x: number;
  y: number;
}

interface BuildMarksProps {
  builds: readonly BuildMark[];
  /** Joined by a line from each build to the next. */
  inOrder?: boolean;
  /** Places that glyphs must not cover. */
  clearOf?: readonly { x: number; y: number }[];
}

const radius = 10;

/** An engine's builds on a chart: a point where each lies, its number and its grade's glyph beside, none on another. */
export function BuildMarks({ builds, inOrder = false, clearOf = [] }: BuildMarksProps) {
  const labels = besideEach(builds, 2.3 * radius, 3.5 * radius, clearOf);
  return (
    <g>
      {inOrder && builds.length > 1 && (
        <path
          d={pathThrough(builds)}
          strokeWidth={lineWeight.mark}
          strokeDasharray="2 3"
          className="fill-none stroke-ink"
        />
      )}
      {builds.map((build, index) => (
        <path
          key={build.build}
          d={pathThrough([build, labels[index]!])}
          strokeWidth={lineWeight.hair}
          className="stroke-line-strong"
        />
      ))}
      {builds.map(({ build, grade, x, y }, index) => {
        const label = labels[index]!;
        return (
          <g key={build}>
            <circle cx={place(x)} cy={place(y)} r="3.4" className="fill-bronze" />
            <Figure
              x={label.x}
              y={grade === undefined ? label.y + 4 : label.y - radius}
              anchor="middle"
              size={grade === undefined ? 12 : 10}
              halo
            >
              {build}
            </Figure>
            {grade !== undefined && <GlyphShape grade={grade} x={label.x} y={label.y} radius={radius} />}
          </g>
        );
      })}
    </g>
  );
}
