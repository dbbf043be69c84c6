import { clearanceText, clearanceUnit, diameterText, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import type { Station } from "~/engineering/trade/fit-kinds";
import { Drawing } from "./drawing";
import { lineWeight } from "./line-weight";
import { place } from "./scale";
import { at, axisAngles, diameterAround, outline } from "./section-shape";
import { Figure, Words } from "./text";

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

const width = 480;
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
        strokeWidth={lineWeight.strong}
        className="fill-none stroke-bronze"
        strokeDasharray={bore.length === 0 ? "4 4" : undefined}
      />
      <path
        d={outline(centreX, centreY, radius(journal, journalRadius))}
        strokeWidth={lineWeight.mark}
        className="fill-plate-deep stroke-ink"
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
      <Words x={centreX} y={height - 6} anchor="middle">
        {`${bore.length > 0 && journal.length > 0 ? "clearance" : "shape"} drawn ${Number(larger.toPrecision(2))} times larger; between the axes not measured`}
      </Words>
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
  const x = centreX + across;
  const y = centreY - up - (angle === 90 ? 14 : 6);
  return (
    <g>
      <path d={tick(angle) + tick(angle + 180)} strokeWidth={lineWeight.hair} className="stroke-ink" />
      <Words x={x} y={y} anchor={anchor}>
        {axisNames[reading.axis]}
      </Words>
      <Figure x={x} y={y + 14} anchor={anchor} tone="ink">
        {text}
      </Figure>
    </g>
  );
}

/** A journal's axis: its name and diameter inside, by the end of a thin line. */
function JournalAxis({ axis, text }: { axis: Axis; text: string }) {
  const angle = axisAngles[axis];
  const [across, up] = at(angle, journalRadius - 12);
  const isUpright = angle === 90;
  return (
    <g>
      <path
        d={`M${place(centreX - across)} ${place(centreY + up)}L${place(centreX + across)} ${place(centreY - up)}`}
        strokeDasharray="10 3 2 3"
        strokeWidth={lineWeight.hair}
        className="stroke-line-strong"
      />
      <Figure x={centreX + (isUpright ? 6 : 12)} y={centreY - (isUpright ? 40 : 7)} tone="ink" size={11}>
        {`${axisNames[axis]} ${text}`}
      </Figure>
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
