import { StepArrow } from "./arrow";
import type { StripPosition } from "./fit-strip-words";
import { lineWeight } from "./line-weight";
import { place } from "./scale";
import { Figure, Words, widthOf } from "./text";

/** Where things lie on a strip, in its own pixels. */
export interface StripFrame {
  left: number;
  right: number;
  top: number;
  floor: number;
  /** From a clearance (m) to a place, kept on the strip. */
  x: (value: number) => number;
  /** Sets the drawing's patterns apart from those of others on the page. */
  id: string;
}

/** Hatched grounds beyond the hard limits, each with its edge. */
export function HardLimits({
  frame,
  limits,
}: {
  frame: StripFrame;
  limits: { least: number; most: number };
}) {
  const { left, right, top, floor, x, id } = frame;
  const least = place(x(limits.least));
  const most = place(x(limits.most));
  return (
    <g>
      <defs>
        <pattern
          id={`${id}-hatch`}
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0V6" strokeWidth="2" className="stroke-line" />
        </pattern>
      </defs>
      <path
        d={`M${left} ${top}H${least}V${floor}H${left}zM${right} ${top}H${most}V${floor}H${right}z`}
        fill={`url(#${id}-hatch)`}
      />
      <path
        d={`M${least} ${top}V${floor}M${most} ${top}V${floor}`}
        strokeWidth={lineWeight.mark}
        className="stroke-line-strong"
      />
    </g>
  );
}

/** The target window as a ground with its edges, the aim as a notch on the axis. */
export function TargetWindow({
  frame,
  window,
}: {
  frame: StripFrame;
  window: { least: number; aim: number; most: number };
}) {
  const { top, floor, x } = frame;
  const least = place(x(window.least));
  const most = place(x(window.most));
  return (
    <g>
      <path d={`M${least} ${top}H${most}V${floor}H${least}z`} className="fill-plate-deep" />
      <path
        d={`M${least} ${top}V${floor}M${most} ${top}V${floor}`}
        strokeWidth={lineWeight.hair}
        strokeDasharray="2 3"
        className="stroke-line-strong"
      />
      <path d={`M${place(x(window.aim))} ${floor}l-5.5 -9h11z`} className="fill-bronze" />
    </g>
  );
}

interface LikelyLimitProps {
  frame: StripFrame;
  from: number;
  to: number;
  /** Written above the band; a strip without words has none. */
  label?: string | undefined;
}

/** Where the limit probably lies: a band that is darkest in its middle, between two ends that say how sure. */
export function LikelyLimit({ frame, from, to, label }: LikelyLimitProps) {
  const { left, right, top, floor, x, id } = frame;
  const start = place(x(from));
  const end = place(x(to));
  const half = label ? widthOf(label) / 2 : 0;
  const middle = Math.min(Math.max((start + end) / 2, left + half), right - half);
  return (
    <g>
      <defs>
        <linearGradient id={`${id}-limit`}>
          <stop offset="0" stopOpacity=".06" className="[stop-color:var(--stop)]" />
          <stop offset=".5" stopOpacity=".34" className="[stop-color:var(--stop)]" />
          <stop offset="1" stopOpacity=".06" className="[stop-color:var(--stop)]" />
        </linearGradient>
      </defs>
      <path d={`M${start} ${top}H${end}V${floor}H${start}z`} fill={`url(#${id}-limit)`} />
      <path
        d={`M${start} ${top + 5}V${top}H${end}v5`}
        strokeWidth={lineWeight.mark}
        className="fill-none stroke-stop"
      />
      {label && (
        <Words x={middle} y={top - 6} anchor="middle" tone="stop">
          {label}
        </Words>
      )}
    </g>
  );
}

interface PositionMarkProps {
  frame: StripFrame;
  position: StripPosition;
  y: number;
  radius: number;
  /** Writes the position's number beside it. */
  numbered: boolean;
}

/** One position: solid as built, open as torn down, its wear as the line between. */
export function PositionMark({ frame, position, y, radius, numbered }: PositionMarkProps) {
  const { assembled, tornDown, number } = position;
  const places = [assembled, tornDown].flatMap((value) => (value === undefined ? [] : [frame.x(value)]));
  const built = assembled === undefined ? undefined : place(frame.x(assembled));
  const torn = tornDown === undefined ? undefined : place(frame.x(tornDown));
  return (
    <g strokeWidth={lineWeight.mark} className="stroke-bronze">
      {built !== undefined && torn !== undefined && <path d={`M${built} ${y}H${torn}`} />}
      {built !== undefined && <circle cx={built} cy={y} r={radius} className="fill-bronze" />}
      {torn !== undefined && <circle cx={torn} cy={y} r={radius} className="fill-plate" />}
      {numbered && (
        <g stroke="none">
          <Figure x={Math.min(...places) - radius - 6} y={y + 3.5} anchor="end" size={10}>
            {number}
          </Figure>
        </g>
      )}
    </g>
  );
}

interface OffScaleProps {
  frame: StripFrame;
  y: number;
  /** Which position and how much; a strip without words only points. */
  text: string | undefined;
  side: "left" | "right";
}

/** A reading far beyond the strip: it points there and says how much, and does not squeeze the others together. */
export function OffScale({ frame, y, text, side }: OffScaleProps) {
  const outward = side === "left" ? -1 : 1;
  const end = side === "left" ? frame.left : frame.right;
  return (
    <g>
      <path d={`M${end} ${y}l${-7 * outward} -4v8z`} className="fill-stop" />
      {text && (
        <Words
          x={end - 11 * outward}
          y={y + 4}
          anchor={side === "left" ? "start" : "end"}
          tone="stop"
          size={11}
          halo
        >
          {text}
        </Words>
      )}
    </g>
  );
}

/** The next step above the axis, with the notch it ends in. */
export function StripStep({
  frame,
  from,
  to,
  label,
}: {
  frame: StripFrame;
  from: number;
  to: number;
  label?: string | undefined;
}) {
  const { floor, x } = frame;
  const y = floor - 15;
  const start = x(from);
  const end = x(to);
  // The words stand behind the arrow's tail, where nothing is claimed.
  const behind = end <= start ? 8 : -8;
  return (
    <g>
      <StepArrow from={{ x: start, y }} to={{ x: end, y }} />
      <path d={`M${place(end)} ${floor}v-11`} strokeWidth={lineWeight.strong} className="stroke-layout" />
      {label && (
        <Words x={start + behind} y={y + 4} anchor={behind > 0 ? "start" : "end"} tone="layout">
          {label}
        </Words>
      )}
    </g>
  );
}
