import { filmText } from "./film-levels";
import { lineWeight } from "./line-weight";
import { pathThrough } from "./scale";
import { Figure, Words } from "./text";

interface Place {
  x: number;
  y: number;
}

interface FilmLinesProps {
  /** In the drawing's own pixels. */
  lines: readonly (readonly Place[])[];
  film: number;
}

/** A contour of the film with its figure. */
export function FilmContour({ lines, film }: FilmLinesProps) {
  const label = labelPlace(lines, 0.9);
  if (!label) return null;
  return (
    <g>
      <path
        d={lines.map(pathThrough).join("")}
        strokeWidth={lineWeight.hair}
        className="fill-none stroke-bronze"
      />
      <Figure x={label.x} y={label.y + 4} anchor="middle" tone="bronze" size={11} halo>
        {filmText(film)}
      </Figure>
    </g>
  );
}

/** The contour of the least film that is allowed. */
export function FilmLimit({ lines, film }: FilmLinesProps) {
  const label = labelPlace(lines, 0.02);
  if (!label) return null;
  return (
    <g>
      <path
        d={lines.map(pathThrough).join("")}
        strokeWidth={lineWeight.strong}
        strokeDasharray="6 4"
        className="fill-none stroke-stop"
      />
      <Words x={label.x + 6} y={label.y + 17} tone="stop" size={12} halo>
        limit: {filmText(film)}
      </Words>
    </g>
  );
}

/** A place along the longest line, at a share of its way from left to right. */
function labelPlace(lines: FilmLinesProps["lines"], share: number): Place | undefined {
  const longest = [...lines].sort((a, b) => b.length - a.length)[0];
  if (!longest || longest.length === 0) return undefined;
  const rightwards = longest[0]!.x <= longest.at(-1)!.x ? longest : [...longest].reverse();
  return rightwards[Math.round((rightwards.length - 1) * share)];
}
