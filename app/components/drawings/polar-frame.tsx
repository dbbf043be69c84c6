import { besideEach } from "./keep-apart";
import { lineWeight } from "./line-weight";
import { pathThrough, place } from "./scale";
import { Figure } from "./text";

interface Place {
  x: number;
  y: number;
}

/** Where a vector of the bearing's frame lies on a drawing: x up, y to the right, as a crank turns clockwise. */
export function onPaper(centre: Place, perUnit: number) {
  return ({ x, y }: Place): Place => ({ x: centre.x + y * perUnit, y: centre.y - x * perUnit });
}

interface PolarRingsProps {
  centre: Place;
  rings: readonly { radius: number; text: string }[];
}

/** Rings round a centre with what each stands for, and the two axes through it. */
export function PolarRings({ centre, rings }: PolarRingsProps) {
  const most = rings.reduce((largest, { radius }) => Math.max(largest, radius), 0);
  return (
    <g>
      {rings.map(({ radius }) => (
        <circle
          key={radius}
          cx={centre.x}
          cy={centre.y}
          r={place(radius)}
          strokeWidth={lineWeight.hair}
          className="fill-none stroke-line"
        />
      ))}
      <path
        d={`M${centre.x} ${place(centre.y - most)}v${place(2 * most)}M${place(centre.x - most)} ${centre.y}h${place(2 * most)}`}
        strokeWidth={lineWeight.hair}
        className="stroke-line-strong"
      />
      {rings.map(({ radius, text }) => (
        <Figure
          key={radius}
          x={centre.x + radius * Math.SQRT1_2 + 3}
          y={centre.y + radius * Math.SQRT1_2 + 9}
          size={10}
          halo
        >
          {text}
        </Figure>
      ))}
    </g>
  );
}

/** Every quarter turn of a cycle, °. */
const quarterTurns = [0, 90, 180, 270, 360, 450, 540, 630] as const;

interface AngleMarksProps<Point> {
  points: readonly Point[];
  toPaper: (point: Point) => Place;
}

/** The crank angle beside a path at every quarter turn. */
export function AngleMarks<Point extends { crankAngle: number }>({
  points,
  toPaper,
}: AngleMarksProps<Point>) {
  const marks = quarterTurns.flatMap((degrees) => {
    const point = nearest(points, degrees);
    return point && Math.abs(degreesOf(point.crankAngle) - degrees) <= 15
      ? [{ degrees, ...toPaper(point) }]
      : [];
  });
  const labels = besideEach(marks, 19, 24);
  return (
    <g>
      {marks.map(({ degrees, x, y }, index) => (
        <g key={degrees}>
          <path
            d={pathThrough([{ x, y }, labels[index]!])}
            strokeWidth={lineWeight.hair}
            className="stroke-line-strong"
          />
          <circle cx={place(x)} cy={place(y)} r="2.8" className="fill-bronze" />
          <Figure x={labels[index]!.x} y={labels[index]!.y + 4} anchor="middle" size={10} tone="ink" halo>
            {degrees}°
          </Figure>
        </g>
      ))}
    </g>
  );
}

/** The point of a path that lies nearest to a crank angle (degrees); undefined on an empty path. */
function nearest<Point extends { crankAngle: number }>(
  points: readonly Point[],
  degrees: number,
): Point | undefined {
  const angle = (degrees * Math.PI) / 180;
  return points.reduce<Point | undefined>(
    (best, point) =>
      best && Math.abs(best.crankAngle - angle) <= Math.abs(point.crankAngle - angle) ? best : point,
    undefined,
  );
}

/** Not more points than a line of this size can show. */
export function thinnedOut<Point>(points: readonly Point[], most: number): Point[] {
  const every = Math.max(1, Math.ceil(points.length / most));
  return points.filter((_, index) => index % every === 0);
}

/** A crank angle (rad) in whole degrees. */
export const degreesOf = (crankAngle: number): number => Math.round((crankAngle * 180) / Math.PI);

/** The points nearest to every thirtieth degree, each once: what a table of a cycle shows. */
export function everyThirty<Point extends { crankAngle: number }>(points: readonly Point[]): Point[] {
  return Array.from({ length: 24 }, (_, index) => nearest(points, index * 30)).filter(
    (point, index, all): point is Point => point !== undefined && all.indexOf(point) === index,
  );
}
