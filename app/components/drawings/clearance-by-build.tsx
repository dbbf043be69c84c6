import {
  clearanceText,
  clearanceUnit,
  clearanceUnitName,
  type PageUnits,
} from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { fromCore } from "~/engineering/quantity/units";
import { GlyphShape } from "./condition-glyph";
import { Drawing } from "./drawing";
import { linearScale, niceTicks, place } from "./scale";

interface BuildColumn {
  build: number;
  /** All in m. */
  target: number;
  positions: readonly { number: number; assembled?: number | undefined; tornDown?: number | undefined }[];
  grade?: number | undefined;
  hours?: number | undefined;
  oil?: string | undefined;
}

interface ClearanceByBuildProps {
  title: string;
  units: PageUnits;
  builds: readonly BuildColumn[];
}

const width = 900;
const height = 300;
const left = 62;
const top = 40;
const floor = height - 44;

/** A fit's clearance build by build: its aim, each position as built and torn down, the worst grade, the oil. */
export function ClearanceByBuild({ title, units, builds }: ClearanceByBuildProps) {
  const values = builds.flatMap((build) => [
    build.target,
    ...build.positions.flatMap(({ assembled, tornDown }) => [
      assembled ?? build.target,
      tornDown ?? build.target,
    ]),
  ]);
  if (values.length === 0) return null;
  const margin = Math.max((Math.max(...values) - Math.min(...values)) * 0.08, 1e-6);
  const from = Math.min(...values) - margin;
  const to = Math.max(...values) + margin;
  const y = linearScale(from, to, floor, top);
  const x = linearScale(-0.5, builds.length - 0.5, left, width - 10);
  const factor = 1 / fromCore(1, clearanceUnitName(units));
  const ticks = niceTicks(from / factor, to / factor, 5).map((tick) => tick * factor);
  const columnWidth = (width - left - 10) / builds.length;
  const text = (value: number) => clearanceText(picometres(value), units);
  const first = builds[0]!;
  const last = builds.at(-1)!;
  return (
    <Drawing
      title={title}
      summary={`${builds.length} builds; the aim went from ${text(first.target)} to ${text(last.target)} ${clearanceUnit(units)}.`}
      width={width}
      height={height}
      table={{
        head: [
          "build",
          `aim, ${clearanceUnit(units)}`,
          "as built",
          "torn down",
          "worst grade",
          "hours",
          "oil",
        ],
        rows: builds.map((build) => [
          `Build ${build.build}`,
          text(build.target),
          range(
            build.positions.flatMap(({ assembled }) => assembled ?? []),
            text,
          ),
          range(
            build.positions.flatMap(({ tornDown }) => tornDown ?? []),
            text,
          ),
          build.grade ?? "–",
          build.hours?.toFixed(1) ?? "–",
          build.oil ?? "–",
        ]),
      }}
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <path d={`M${left} ${place(y(tick))}H${width - 10}`} stroke="var(--line)" />
          <text
            x={left - 8}
            y={place(y(tick)) + 4}
            textAnchor="end"
            fontSize="11"
            fill="var(--mute)"
            className="font-mono"
          >
            {clearanceText(picometres(tick), units, -1)}
          </text>
        </g>
      ))}
      {builds.map((build, index) => {
        const middle = x(index);
        const half = Math.min(26, columnWidth * 0.36);
        const spread = linearScale(0, Math.max(1, build.positions.length - 1), middle - half, middle + half);
        const oilChanged = index > 0 && build.oil !== builds[index - 1]?.oil;
        return (
          <g key={build.build}>
            {oilChanged && (
              <path
                d={`M${place(middle - columnWidth / 2)} ${top - 12}V${floor}`}
                stroke="var(--oil-middle)"
                strokeWidth="2"
                strokeDasharray="2 3"
              />
            )}
            <path
              d={`M${place(middle - half - 4)} ${place(y(build.target))}H${place(middle + half + 4)}`}
              stroke="var(--layout)"
              strokeWidth="1.6"
            />
            {build.positions.map(({ number, assembled, tornDown }, at) => (
              <g key={number} stroke="var(--bronze)">
                {assembled !== undefined && tornDown !== undefined && (
                  <path d={`M${place(spread(at))} ${place(y(assembled))}V${place(y(tornDown))}`} />
                )}
                {assembled !== undefined && (
                  <circle cx={place(spread(at))} cy={place(y(assembled))} r="2.2" fill="var(--bronze)" />
                )}
                {tornDown !== undefined && (
                  <circle cx={place(spread(at))} cy={place(y(tornDown))} r="2.2" fill="var(--plate)" />
                )}
              </g>
            ))}
            {build.grade !== undefined && (
              <GlyphShape grade={build.grade} x={place(middle)} y={16} radius={9} />
            )}
            <text x={place(middle)} y={floor + 18} textAnchor="middle" fontSize="11" fill="var(--ink)">
              {build.build}
            </text>
            <text
              x={place(middle)}
              y={floor + 32}
              textAnchor="middle"
              fontSize="10"
              fill="var(--mute)"
              className="font-mono"
            >
              {build.hours === undefined ? "" : `${build.hours.toFixed(1)} h`}
            </text>
          </g>
        );
      })}
      <path d={`M${left} ${top}V${floor}H${width - 10}`} fill="none" stroke="var(--line-strong)" />
      <text x={0} y={12} fontSize="11" fill="var(--mute)">
        clearance, {clearanceUnit(units)}
      </text>
    </Drawing>
  );
}

function range(values: number[], text: (value: number) => string): string {
  if (values.length === 0) return "–";
  return `${text(Math.min(...values))} to ${text(Math.max(...values))}`;
}
