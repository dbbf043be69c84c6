import { lineWeight } from "./line-weight";
import { place } from "./scale";

interface Point {
  x: number;
  y: number;
}

/** The arrow of the next step, in the marking colour. Nothing where it would go nowhere. */
export function StepArrow({ from, to }: { from: Point; to: Point }) {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length < 1) return null;
  const along = { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
  // A short arrow has a short head, so that its shaft still shows.
  const head = Math.min(9, length * 0.6);
  const neck = { x: to.x - along.x * head, y: to.y - along.y * head };
  const half = head * 0.55;
  const corner = (side: number) =>
    `${place(neck.x - along.y * half * side)} ${place(neck.y + along.x * half * side)}`;
  return (
    <g>
      <path
        d={`M${place(from.x)} ${place(from.y)}L${place(neck.x)} ${place(neck.y)}`}
        strokeWidth={lineWeight.strong}
        className="stroke-layout"
      />
      <path d={`M${place(to.x)} ${place(to.y)}L${corner(1)}L${corner(-1)}z`} className="fill-layout" />
    </g>
  );
}
