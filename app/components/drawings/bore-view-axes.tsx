import type { Station } from "~/engineering/trade/fit-kinds";
import { lineWeight } from "./line-weight";
import { place } from "./scale";
import { at, axisAngles } from "./section-shape";
import { Figure, Words } from "./text";

type Axis = Station["axis"];

/** A diameter (m) measured on one axis. */
export interface AxisReading {
  axis: Axis;
  value: number;
}

/** The axes as they are called on a drawing. */
export const axisNames: Record<Axis, string> = {
  vertical: "vertical 90°",
  plus45: "+45°",
  minus45: "−45°",
  horizontal: "horizontal 0°",
  a: "A",
  b: "B",
};

/** Where a section lies on its drawing. */
export interface SectionFrame {
  x: number;
  y: number;
  journalRadius: number;
  outerRadius: number;
}

interface BoreAxisProps {
  frame: SectionFrame;
  reading: AxisReading;
  radius: (degrees: number) => number;
  diameter: string;
  /** Of this axis, where the journal is measured too. */
  clearance: string | undefined;
}

/** A bore's axis: a tick through its surface at both ends; outside its name and diameter, at the far end its clearance. */
export function BoreAxis({ frame, reading, radius, diameter, clearance }: BoreAxisProps) {
  const angle = axisAngles[reading.axis];
  const distance = radius(angle);
  const tick = (degrees: number) => {
    const [fromAcross, fromUp] = at(degrees, distance - 5);
    const [toAcross, toUp] = at(degrees, frame.outerRadius + 5);
    return `M${place(frame.x + fromAcross)} ${place(frame.y - fromUp)}L${place(frame.x + toAcross)} ${place(frame.y - toUp)}`;
  };
  const [across, up] = at(angle, frame.outerRadius + 9);
  const anchor = angle === 90 ? "middle" : angle > 90 ? "end" : "start";
  const x = frame.x + across;
  const y = frame.y - up - (angle === 90 ? 14 : 6);
  const farAnchor = angle === 90 ? "middle" : angle > 90 ? "start" : "end";
  return (
    <g>
      <path d={tick(angle) + tick(angle + 180)} strokeWidth={lineWeight.hair} className="stroke-ink" />
      <Words x={x} y={y} anchor={anchor}>
        {axisNames[reading.axis]}
      </Words>
      <Figure x={x} y={y + 14} anchor={anchor} tone="ink">
        {diameter}
      </Figure>
      {clearance && (
        <Figure
          x={frame.x - across}
          y={frame.y + up + (angle === 90 ? 11 : 8)}
          anchor={farAnchor}
          tone="bronze"
        >
          {clearance}
        </Figure>
      )}
    </g>
  );
}

/** A journal's axis: its name and diameter inside, by the end of a thin line. */
export function JournalAxis({
  frame,
  axis,
  diameter,
}: {
  frame: SectionFrame;
  axis: Axis;
  diameter: string;
}) {
  const angle = axisAngles[axis];
  const [across, up] = at(angle, frame.journalRadius - 10);
  const isUpright = angle === 90;
  return (
    <g>
      <path
        d={`M${place(frame.x - across)} ${place(frame.y + up)}L${place(frame.x + across)} ${place(frame.y - up)}`}
        strokeDasharray="10 3 2 3"
        strokeWidth={lineWeight.hair}
        className="stroke-line-strong"
      />
      <Figure x={frame.x + 6} y={frame.y - (isUpright ? 36 : 7)} tone="ink" size={10}>
        {`${axisNames[axis]} ${diameter}`}
      </Figure>
    </g>
  );
}
