import { clearanceText, clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { LeftAxis } from "./axis";
import { clearanceTicks } from "./clearance-axis";
import { GlyphShape } from "./condition-glyph";
import { Drawing, type DrawingTable } from "./drawing";
import { lineWeight } from "./line-weight";
import { MarkKey } from "./mark-key";
import { OilLane } from "./oil-lane";
import { linearScale, pathThrough, place, spanOf } from "./scale";
import { Figure, Words } from "./text";

interface BuildColumn {
  build: number;
  /** All in m. */
  target: number;
  window?: { least: number; most: number } | undefined;
  positions: readonly { number: number; assembled?: number | undefined; tornDown?: number | undefined }[];
  grade?: number | undefined;
  hours?: number | undefined;
  oil?: string | undefined;
  /** Of that oil, mm²/s. */
  kv100?: number | undefined;
}

interface ClearanceByBuildProps {
  title: string;
  units: PageUnits;
  /** Oldest first. */
  builds: readonly BuildColumn[];
}

const width = 900;
const left = 62;
const right = width - 10;
const top = 76;
const floor = 306;

const rowHeads = [
  { head: "grade", y: 44 },
  { head: "build", y: floor + 17 },
  { head: "hours", y: floor + 31 },
  { head: "oil", y: floor + 46 },
] as const;

/** A fit's clearance build by build: window and aim, each position as built and torn down, worst grade, hours, oil. */
export function ClearanceByBuild({ title, units, builds }: ClearanceByBuildProps) {
  if (builds.length === 0) return null;
  const y = scaleOf(builds);
  const columnWidth = (right - left) / builds.length;
  const middleOf = (index: number) => left + (index + 0.5) * columnWidth;
  const means = builds.flatMap((build, index) => {
    const mean = meanOf(build.positions.flatMap(({ assembled }) => assembled ?? []));
    return mean === undefined ? [] : [{ x: middleOf(index), y: y.scale(mean) }];
  });
  return (
    <Drawing
      title={title}
      summary={summaryOf(builds, units)}
      width={width}
      height={floor + 68}
      leastWidth={Math.min(width, Math.max(520, left + 10 + builds.length * 34))}
      table={tableOf(builds, units)}
    >
      <LeftAxis
        ticks={clearanceTicks(y.span, units, 8)}
        scale={y.scale}
        left={left}
        right={right}
        top={top - 8}
        floor={floor}
      />
      <Words x={0} y={12}>
        clearance at 20 °C, {clearanceUnit(units)}
      </Words>
      <MarkKey
        x={right - 460}
        y={12}
        marks={[
          "built",
          "torn",
          "mean",
          "target",
          ...(builds.some(({ window }) => window) ? (["window"] as const) : []),
        ]}
      />
      {rowHeads.map(({ head, y }) => (
        <Words key={head} x={left - 9} y={y} anchor="end" size={11}>
          {head}
        </Words>
      ))}
      <OilLane
        oils={builds.map(({ oil, kv100 }) => ({ name: oil, kv100 }))}
        left={left}
        columnWidth={columnWidth}
        y={floor + 38}
        top={top - 8}
      />
      {builds.map((build, index) => (
        <Column key={build.build} build={build} middle={middleOf(index)} width={columnWidth} y={y.scale} />
      ))}
      {means.length > 1 && (
        <path
          d={pathThrough(means)}
          strokeWidth={lineWeight.mark}
          className="fill-none stroke-bronze opacity-60"
        />
      )}
    </Drawing>
  );
}

function scaleOf(builds: readonly BuildColumn[]) {
  const values = builds.flatMap(({ target, window, positions }) => [
    target,
    ...(window ? [window.least, window.most] : []),
    ...positions.flatMap(({ assembled, tornDown }) => [assembled ?? target, tornDown ?? target]),
  ]);
  const span = spanOf(values, 2e-6);
  return { span, scale: linearScale(span.from, span.to, floor, top) };
}

interface ColumnProps {
  build: BuildColumn;
  middle: number;
  width: number;
  y: (value: number) => number;
}

function Column({ build, middle, width, y }: ColumnProps) {
  const { target, window, positions, grade, hours } = build;
  const half = Math.min(34, width * 0.38);
  const spread = linearScale(0, Math.max(1, positions.length - 1), middle - half * 0.7, middle + half * 0.7);
  const wide = width >= 34;
  return (
    <g>
      {window && (
        <>
          <path
            d={`M${place(middle - half)} ${place(y(window.most))}H${place(middle + half)}V${place(y(window.least))}H${place(middle - half)}z`}
            className="fill-plate-deep"
          />
          <path
            d={`M${place(middle - half)} ${place(y(window.most))}h${place(2 * half)}M${place(middle - half)} ${place(y(window.least))}h${place(2 * half)}`}
            strokeWidth={lineWeight.hair}
            strokeDasharray="2 3"
            className="stroke-line-strong"
          />
        </>
      )}
      <path
        d={`M${place(middle - half)} ${place(y(target))}h${place(2 * half)}`}
        strokeWidth={lineWeight.mark}
        className="stroke-layout"
      />
      {positions.map(({ number, assembled, tornDown }, index) => {
        const x = place(positions.length === 1 ? middle : spread(index));
        return (
          <g key={number} strokeWidth={lineWeight.mark} className="stroke-bronze">
            {assembled !== undefined && tornDown !== undefined && (
              <path d={`M${x} ${place(y(assembled))}V${place(y(tornDown))}`} />
            )}
            {assembled !== undefined && (
              <circle cx={x} cy={place(y(assembled))} r="2.4" className="fill-bronze" />
            )}
            {tornDown !== undefined && (
              <circle cx={x} cy={place(y(tornDown))} r="2.4" className="fill-plate" />
            )}
          </g>
        );
      })}
      {grade !== undefined && (
        <GlyphShape grade={grade} x={middle} y={39} radius={Math.min(11, width * 0.4)} />
      )}
      <Figure x={middle} y={floor + 17} anchor="middle" tone="ink">
        {build.build}
      </Figure>
      {wide && hours !== undefined && (
        <Figure x={middle} y={floor + 31} anchor="middle" size={10}>
          {hours.toFixed(1)} h
        </Figure>
      )}
    </g>
  );
}

function meanOf(values: readonly number[]): number | undefined {
  return values.length === 0 ? undefined : values.reduce((sum, value) => sum + value, 0) / values.length;
}

function summaryOf(builds: readonly BuildColumn[], units: PageUnits): string {
  const text = (value: number) => clearanceText(picometres(value), units);
  const [first, last] = [builds[0]!, builds.at(-1)!];
  if (builds.length === 1) return `One build, aimed at ${text(first.target)} ${clearanceUnit(units)}.`;
  return `${builds.length} builds; the aim went from ${text(first.target)} to ${text(last.target)} ${clearanceUnit(units)}.`;
}

function tableOf(builds: readonly BuildColumn[], units: PageUnits): DrawingTable {
  const text = (value: number) => clearanceText(picometres(value), units);
  const range = (values: readonly number[]) =>
    values.length === 0 ? "–" : `${text(Math.min(...values))} to ${text(Math.max(...values))}`;
  return {
    head: ["build", `aim, ${clearanceUnit(units)}`, "as built", "torn down", "worst grade", "hours", "oil"],
    rows: builds.map(({ build, target, positions, grade, hours, oil }) => [
      `Build ${build}`,
      text(target),
      range(positions.flatMap(({ assembled }) => assembled ?? [])),
      range(positions.flatMap(({ tornDown }) => tornDown ?? [])),
      grade ?? "–",
      hours?.toFixed(1) ?? "–",
      oil ?? "–",
    ]),
  };
}
