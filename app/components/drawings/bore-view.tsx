import { clearanceText, clearanceUnit, diameterText, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import type { Station } from "~/engineering/trade/fit-kinds";
import { Drawing } from "./drawing";
import { place } from "./scale";
import { at, axisAngles, diameterAround, outline } from "./section-shape";

type Axis = Station["axis"];

interface AxisReading {
  axis: Axis;
  /** Diameter, m. */
  value: number;
}

interface BoreViewProps {
  title: string;
  units: PageUnits;
  /** One plane's readings, one an axis. */
  bore: readonly AxisReading[];
  journal: readonly AxisReading[];
  /** Nominal diameter, m: it stands in for a journal that is not measured. */
  nominal: number;
  /** The same bore as it was built, at teardown: what lies between is shaded as wear. */
  boreAsBuilt?: readonly AxisReading[] | undefined;
}

const axisNames: Record<Axis, string> = {
  vertical: "vertical 90°",
  plus45: "+45°",
  minus45: "−45°",
  horizontal: "horizontal 0°",
  a: "A",
  b: "B",
};

const width = 460;
const height = 346;
const centreX = width / 2;
const centreY = 172;
const journalRadius = 88;
/** The widest gap as it is drawn, px. */
const gap = 28;
const outerRadius = journalRadius + gap + 16;
/** Less than this, m, is not blown up further: the error of a gauge would look like a shape. */
const leastGap = 10e-6;

/** Bore and journal in section, centred, the clearance many times larger than it is, each measured axis by name. */
export function BoreView({ title, units, bore, journal, nominal, boreAsBuilt = [] }: BoreViewProps) {
  if (bore.length === 0 && journal.length === 0) return null;
  const base = journal.length > 0 ? mean(journal) : nominal;
  const widest = Math.max(
    ...[...bore, ...journal, ...boreAsBuilt].map(({ value }) => Math.abs(value - base)),
    leastGap,
  );
  const radius = (readings: readonly AxisReading[], unmeasured: number) => {
    if (readings.length === 0) return () => unmeasured;
    const diameter = diameterAround(new Map(readings.map(({ axis, value }) => [axisAngles[axis], value])));
    return (degrees: number) => journalRadius + ((diameter(degrees) - base) / widest) * gap;
  };
  const boreRadius = radius(bore, journalRadius + gap);
  const larger = ((gap / widest) * base) / journalRadius;
  const figure = (value: number) => diameterText(picometres(value), units);
  const hatch = `${title.replaceAll(/[^a-z0-9]+/gi, "-")}-shell`;
  const outer = outline(centreX, centreY, () => outerRadius);
  const boreOutline = outline(centreX, centreY, boreRadius);

  return (
    <Drawing
      title={title}
      summary={summaryOf(bore, journal, units)}
      width={width}
      height={height}
      table={{
        head: ["axis", `diameter, ${units === "inch" ? "in" : "mm"}`],
        rows: [
          ...boreAsBuilt.map(({ axis, value }) => [`bore as built, ${axisNames[axis]}`, figure(value)]),
          ...bore.map(({ axis, value }) => [`bore, ${axisNames[axis]}`, figure(value)]),
          ...journal.map(({ axis, value }) => [`journal, ${axisNames[axis]}`, figure(value)]),
        ],
      }}
    >
      <pattern id={hatch} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path d="M0 0V5" stroke="var(--line-strong)" strokeWidth="1" />
      </pattern>
      <path d={outer + boreOutline} fillRule="evenodd" fill={`url(#${hatch})`} />
      {bore.length > 0 && boreAsBuilt.length > 0 && (
        <path
          d={boreOutline + outline(centreX, centreY, radius(boreAsBuilt, journalRadius))}
          fillRule="evenodd"
          fill="var(--watch)"
          fillOpacity=".45"
          data-wear=""
        />
      )}
      <path
        d={boreOutline}
        fill="none"
        stroke="var(--bronze)"
        strokeWidth="2"
        strokeDasharray={bore.length === 0 ? "4 4" : undefined}
      />
      <path
        d={outline(centreX, centreY, radius(journal, journalRadius))}
        fill="var(--plate-deep)"
        stroke="var(--ink)"
        strokeWidth="1.5"
        strokeDasharray={journal.length === 0 ? "4 4" : undefined}
      />
      <path
        d={`M${centreX - 6} ${centreY}h12M${centreX} ${centreY - 6}v12`}
        stroke="var(--line-strong)"
        fill="none"
      />
      {bore.map((reading) => (
        <BoreAxis key={reading.axis} reading={reading} radius={boreRadius} text={figure(reading.value)} />
      ))}
      {journal.map(({ axis, value }) => (
        <JournalAxis key={axis} axis={axis} text={figure(value)} />
      ))}
      <text x={centreX} y={height - 6} textAnchor="middle" fontSize="11" fill="var(--mute)">
        {`clearance drawn ${Number(larger.toPrecision(2))} times larger; between the axes not measured`}
      </text>
    </Drawing>
  );
}

interface BoreAxisProps {
  reading: AxisReading;
  radius: (degrees: number) => number;
  text: string;
}

/** A bore's axis: a tick through its surface at both ends, its name and diameter outside the upper one. */
function BoreAxis({ reading, radius, text }: BoreAxisProps) {
  const angle = axisAngles[reading.axis];
  const distance = radius(angle);
  const tick = (degrees: number) => {
    const [fromAcross, fromUp] = at(degrees, distance - 5);
    const [toAcross, toUp] = at(degrees, outerRadius + 5);
    return `M${place(centreX + fromAcross)} ${place(centreY - fromUp)}L${place(centreX + toAcross)} ${place(centreY - toUp)}`;
  };
  const [across, up] = at(angle, outerRadius + 9);
  const anchor = angle === 90 ? "middle" : angle > 90 ? "end" : "start";
  const x = place(centreX + across);
  const y = place(centreY - up) - (angle === 90 ? 14 : 6);
  return (
    <g fontSize="11" textAnchor={anchor}>
      <path d={tick(angle) + tick(angle + 180)} stroke="var(--ink)" fill="none" />
      <text x={x} y={y} fill="var(--mute)">
        {axisNames[reading.axis]}
      </text>
      <text x={x} y={y + 13} fill="var(--ink)" className="font-mono">
        {text}
      </text>
    </g>
  );
}

/** A journal's axis: its name and diameter inside, by the end of a thin line. */
function JournalAxis({ axis, text }: { axis: Axis; text: string }) {
  const angle = axisAngles[axis];
  const [across, up] = at(angle, journalRadius - 12);
  const [textAcross, textUp] = at(angle, 46);
  return (
    <g fontSize="11">
      <path
        d={`M${place(centreX - across)} ${place(centreY + up)}L${place(centreX + across)} ${place(centreY - up)}`}
        stroke="var(--line-strong)"
        strokeDasharray="10 3 2 3"
        strokeWidth=".8"
      />
      <text
        x={place(centreX + textAcross)}
        y={place(centreY - textUp) - (angle === 90 ? 0 : 6)}
        textAnchor="middle"
        fill="var(--ink)"
        stroke="var(--plate-deep)"
        strokeWidth="4"
        paintOrder="stroke"
        className="font-mono"
      >
        {axisNames[axis]} {text}
      </text>
    </g>
  );
}

function mean(readings: readonly AxisReading[]): number {
  return readings.reduce((sum, { value }) => sum + value, 0) / readings.length;
}

function summaryOf(bore: readonly AxisReading[], journal: readonly AxisReading[], units: PageUnits): string {
  if (bore.length === 0) return `Journal measured on ${journal.length} axes, bore not yet.`;
  if (journal.length === 0) return `Bore measured on ${bore.length} axes, journal not yet.`;
  const clearances = bore.map(({ value }) => picometres(value - mean(journal)));
  const text = (value: number) => clearanceText(value, units);
  return `Clearance from ${text(Math.min(...clearances))} to ${text(Math.max(...clearances))} ${clearanceUnit(units)} over ${bore.length} measured axes.`;
}
