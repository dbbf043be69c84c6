import { lineWeight } from "./line-weight";
import { oilTone } from "./oil-tone";
import { place } from "./scale";
import { cutTo, Words } from "./text";

interface OilLaneProps {
  /** The oil of each column from left to right. */
  oils: readonly { name?: string | undefined; kv100?: number | undefined }[];
  left: number;
  columnWidth: number;
  y: number;
  /** Up to where a change of oil is marked across the drawing. */
  top: number;
}

/** Which oil ran in which build: a stripe below the columns in the oil's tone with its name, a line up at each change. */
export function OilLane({ oils, left, columnWidth, y, top }: OilLaneProps) {
  const stretches = stretchesOf(oils.map(({ name }) => name));
  return (
    <g>
      {stretches.map(({ name, from, to }) => {
        if (name === undefined) return null;
        const start = place(left + from * columnWidth + 2);
        const end = place(left + to * columnWidth - 2);
        return (
          <g key={from}>
            {from > 0 && (
              <path
                d={`M${place(start - 2)} ${top}V${y}`}
                strokeWidth={lineWeight.hair}
                strokeDasharray="2 3"
                className="stroke-bronze"
              />
            )}
            <rect
              x={start}
              y={y}
              width={place(Math.max(0, end - start))}
              height="7"
              fill={oilTone(oils[from]?.kv100)}
              strokeWidth={lineWeight.hair}
              className="stroke-bronze"
            />
            <Words x={start} y={y + 20} size={11}>
              {cutTo(name, end - start, 11)}
            </Words>
          </g>
        );
      })}
    </g>
  );
}

/** Neighbours of one name as one stretch, `to` exclusive. */
function stretchesOf(names: readonly (string | undefined)[]) {
  const stretches: { name: string | undefined; from: number; to: number }[] = [];
  names.forEach((name, index) => {
    const last = stretches.at(-1);
    if (last && last.name === name) last.to = index + 1;
    else stretches.push({ name, from: index, to: index + 1 });
  });
  return stretches;
}
