import { useId } from "react";
import {
  clearanceText,
  clearanceUnit,
  diameterText,
  diameterUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { type AxisReading, axisNames, BoreAxis, JournalAxis, type SectionFrame } from "./bore-view-axes";
import { Drawing } from "./drawing";
import { lineWeight } from "./line-weight";
import { axisAngles, diameterAround, outline } from "./section-shape";
import { Words } from "./text";

interface BoreViewProps {
  title: string;
  units: PageUnits;
  /** One plane's readings, one an axis. */
  bore: readonly AxisReading[];
  journal: readonly AxisReading[];
  /** Nominal diameter, m: it stands in for a journal that is not measured. */
  nominal: number;
  /** The same bore and journal as they were built, at teardown: what lies between is shaded as wear. */
  boreAsBuilt?: readonly AxisReading[] | undefined;
  journalAsBuilt?: readonly AxisReading[] | undefined;
}

const width = 480;
const height = 384;
const journalRadius = 74;
/** The widest gap as it is drawn, px. */
const gap = 46;
const frame: SectionFrame = {
  x: width / 2,
  y: 186,
  journalRadius,
  outerRadius: journalRadius + gap + 14,
};
/** Less than this, m, is not blown up further: the error of a gauge would look like a shape. */
const leastGap = 10e-6;

/** Bore and journal in section, centred, the clearance many times larger than it is, each measured axis by name. */
export function BoreView(props: BoreViewProps) {
  const { title, units, bore, journal, nominal, boreAsBuilt = [], journalAsBuilt = [] } = props;
  const hatch = useId();
  if (bore.length === 0 && journal.length === 0) return null;
  const base = journal.length > 0 ? meanOf(journal) : nominal;
  const widest = Math.max(
    ...[...bore, ...journal, ...boreAsBuilt, ...journalAsBuilt].map(({ value }) => Math.abs(value - base)),
    leastGap,
  );
  const radiusOf = (readings: readonly AxisReading[], unmeasured: number) => {
    if (readings.length === 0) return () => unmeasured;
    const diameter = diameterAround(new Map(readings.map(({ axis, value }) => [axisAngles[axis], value])));
    return (degrees: number) => journalRadius + ((diameter(degrees) - base) / widest) * gap;
  };
  const draw = (radius: (degrees: number) => number) => outline(frame.x, frame.y, radius);
  const boreRadius = radiusOf(bore, journalRadius + gap);
  const boreOutline = draw(boreRadius);
  const journalOutline = draw(radiusOf(journal, journalRadius));
  const larger = ((gap / widest) * base) / journalRadius;
  const both = bore.length > 0 && journal.length > 0;
  return (
    <Drawing
      title={title}
      summary={summaryOf(bore, journal, units)}
      width={width}
      height={height}
      table={tableOf({ ...props, boreAsBuilt, journalAsBuilt })}
    >
      <defs>
        <pattern id={hatch} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V5" strokeWidth={lineWeight.hair} className="stroke-line-strong" />
        </pattern>
      </defs>
      <path d={draw(() => frame.outerRadius) + boreOutline} fillRule="evenodd" fill={`url(#${hatch})`} />
      <path
        d={journalOutline}
        strokeWidth={lineWeight.mark}
        strokeDasharray={journal.length === 0 ? "4 4" : undefined}
        className="fill-plate-deep stroke-ink"
      />
      <path
        d={boreOutline}
        strokeWidth={lineWeight.mark}
        strokeDasharray={bore.length === 0 ? "4 4" : undefined}
        className="fill-none stroke-bronze"
      />
      {bore.length > 0 && boreAsBuilt.length > 0 && (
        <Wear now={boreOutline} before={draw(radiusOf(boreAsBuilt, journalRadius))} />
      )}
      {journal.length > 0 && journalAsBuilt.length > 0 && (
        <Wear now={journalOutline} before={draw(radiusOf(journalAsBuilt, journalRadius))} />
      )}
      {bore.map((reading) => (
        <BoreAxis
          key={reading.axis}
          frame={frame}
          reading={reading}
          radius={boreRadius}
          diameter={diameterText(picometres(reading.value), units)}
          clearance={both ? clearanceText(picometres(reading.value - base), units) : undefined}
        />
      ))}
      {journal.map(({ axis, value }) => (
        <JournalAxis key={axis} frame={frame} axis={axis} diameter={diameterText(picometres(value), units)} />
      ))}
      <Words x={frame.x} y={height - 21} anchor="middle">
        {`${both ? "clearance" : "shape"} drawn ${Number(larger.toPrecision(2))} times larger; between the axes not measured`}
      </Words>
      {both && (
        <Words x={frame.x} y={height - 5} anchor="middle">
          {`at the far end of each axis its clearance, ${clearanceUnit(units)}`}
        </Words>
      )}
    </Drawing>
  );
}

/** What went between two outlines of one part. */
function Wear({ now, before }: { now: string; before: string }) {
  return (
    <g data-wear="">
      <path d={now + before} fillRule="evenodd" fillOpacity=".55" className="fill-watch" />
      <path
        d={before}
        strokeWidth={lineWeight.hair}
        strokeDasharray="3 2"
        className="fill-none stroke-watch"
      />
    </g>
  );
}

function meanOf(readings: readonly AxisReading[]): number {
  return readings.reduce((sum, { value }) => sum + value, 0) / readings.length;
}

function summaryOf(bore: readonly AxisReading[], journal: readonly AxisReading[], units: PageUnits): string {
  if (bore.length === 0) return `Journal measured on ${journal.length} axes, bore not yet.`;
  if (journal.length === 0) return `Bore measured on ${bore.length} axes, journal not yet.`;
  const clearances = bore.map(({ value }) => picometres(value - meanOf(journal)));
  const text = (value: number) => clearanceText(value, units);
  return `Clearance from ${text(Math.min(...clearances))} to ${text(Math.max(...clearances))} ${clearanceUnit(units)} over ${bore.length} measured axes.`;
}

function tableOf({ units, bore, journal, boreAsBuilt = [], journalAsBuilt = [] }: BoreViewProps) {
  const rows = (part: string, readings: readonly AxisReading[]) =>
    readings.map(({ axis, value }) => [
      `${part}, ${axisNames[axis]}`,
      diameterText(picometres(value), units),
    ]);
  return {
    head: ["axis", `diameter, ${diameterUnitName(units)}`],
    rows: [
      ...rows("bore as built", boreAsBuilt),
      ...rows("bore", bore),
      ...rows("journal as built", journalAsBuilt),
      ...rows("journal", journal),
    ],
  };
}
