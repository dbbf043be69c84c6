import { GlyphShape } from "./condition-glyph";
import { keepApart } from "./keep-apart";
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

const radius = 10;

/** An engine's builds in order on a chart: a line from one to the next, each with its grade's glyph and its number. */
export function BuildMarks({ builds, ordered = true }: { builds: readonly BuildMark[]; ordered?: boolean }) {
  const places = keepApart(builds, radius * 3.1);
  return (
    <g>
      {ordered && builds.length > 1 && (
        <path
          d={pathThrough(builds)}
          strokeWidth={lineWeight.mark}
          strokeDasharray="1 3"
          className="fill-none stroke-ink"
        />
      )}
      {builds.map(({ build, grade, x, y }, index) => {
        const label = places[index]!;
        const moved = label.x !== x || label.y !== y;
        return (
          <g key={build}>
            {moved && (
              <>
                <path
                  d={pathThrough([{ x, y }, label])}
                  strokeWidth={lineWeight.hair}
                  className="stroke-line-strong"
                />
                <circle cx={place(x)} cy={place(y)} r="2.4" className="fill-bronze" />
              </>
            )}
            {grade === undefined ? (
              <circle
                cx={place(label.x)}
                cy={place(label.y)}
                r="4"
                strokeWidth={lineWeight.mark}
                className="fill-plate stroke-bronze"
              />
            ) : (
              <GlyphShape grade={grade} x={label.x} y={label.y - 2} radius={radius} />
            )}
            <Figure x={label.x} y={label.y - radius - 3} anchor="middle" size={10} halo>
              {build}
            </Figure>
          </g>
        );
      })}
    </g>
  );
}
