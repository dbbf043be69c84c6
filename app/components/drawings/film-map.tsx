import { clearanceText, clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { StepArrow } from "./arrow";
import { BottomAxis, LeftAxis } from "./axis";
import { BuildMarks } from "./build-marks";
import { clearanceTicks, plainTicks } from "./clearance-axis";
import { contourLines, type Field, type Point } from "./contours";
import { Drawing } from "./drawing";
import { filmLevels, filmText } from "./film-levels";
import { FilmContour, FilmLimit } from "./film-lines";
import { linearScale } from "./scale";

interface FilmMapProps {
  title: string;
  units: PageUnits;
  /** Diametral at 20 °C, m, rising. */
  clearances: readonly number[];
  /** Dynamic, in the film, Pa·s, rising. */
  viscosities: readonly number[];
  /** Least film, m: a row for each clearance, in it a value for each viscosity. */
  leastFilm: readonly (readonly number[])[];
  /** The least film that this fit is allowed, m. */
  limitFilm?: number | undefined;
  /** The engine's builds in order; clearance m, viscosity Pa·s. */
  builds: readonly { build: number; clearance: number; viscosity: number; grade?: number | undefined }[];
  next?: { clearance: number; viscosity: number } | undefined;
}

const width = 640;
const left = 54;
const right = width - 40;
const top = 30;
const floor = 340;

/** What film a bearing has over clearance and viscosity, with the engine's own builds, the limit and the next step on it. */
export function FilmMap({
  title,
  units,
  clearances,
  viscosities,
  leastFilm,
  limitFilm,
  builds,
  next,
}: FilmMapProps) {
  if (clearances.length < 2 || viscosities.length < 2) return null;
  const field: Field = { xs: clearances, ys: viscosities, values: leastFilm };
  const x = linearScale(clearances[0]!, clearances.at(-1)!, left, right);
  const y = linearScale(viscosities[0]!, viscosities.at(-1)!, floor, top);
  const onMap = (point: Point) => ({ x: x(point.x), y: y(point.y) });
  const films = leastFilm.flat().filter(Number.isFinite);
  const unit = clearanceUnit(units);
  const last = builds.at(-1);
  const millipascal = { from: viscosities[0]! * 1e3, to: viscosities.at(-1)! * 1e3 };
  return (
    <Drawing
      title={title}
      summary={summaryOf({ units, builds, next, limitFilm })}
      width={width}
      height={floor + 42}
      table={{
        head: ["build", `clearance, ${unit}`, "viscosity, mPa·s", "grade"],
        rows: [
          ...builds.map(({ build, clearance, viscosity, grade }) => [
            `Build ${build}`,
            clearanceText(picometres(clearance), units),
            (viscosity * 1e3).toFixed(1),
            grade ?? "–",
          ]),
          ...(next
            ? [
                [
                  "next",
                  clearanceText(picometres(next.clearance), units),
                  (next.viscosity * 1e3).toFixed(1),
                  "–",
                ],
              ]
            : []),
        ],
      }}
    >
      <LeftAxis
        ticks={plainTicks(millipascal, 6).map(({ value, text }) => ({ value: value / 1e3, text }))}
        scale={y}
        left={left}
        right={right}
        top={top}
        floor={floor}
        label="viscosity in the film, mPa·s"
        grid={false}
      />
      <BottomAxis
        ticks={clearanceTicks({ from: clearances[0]!, to: clearances.at(-1)! }, units, 7)}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label={`clearance at 20 °C, ${unit}`}
      />
      {filmLevels(films, 8).map((level) => (
        <FilmContour
          key={level}
          lines={contourLines(field, level).map((line) => line.map(onMap))}
          film={level}
        />
      ))}
      {limitFilm !== undefined && (
        <FilmLimit lines={contourLines(field, limitFilm).map((line) => line.map(onMap))} film={limitFilm} />
      )}
      <BuildMarks
        inOrder
        builds={builds.map(({ build, grade, clearance, viscosity }) => ({
          build,
          grade,
          ...onMap({ x: clearance, y: viscosity }),
        }))}
      />
      {next && last && (
        <StepArrow
          from={onMap({ x: last.clearance, y: last.viscosity })}
          to={onMap({ x: next.clearance, y: next.viscosity })}
        />
      )}
    </Drawing>
  );
}

function summaryOf({
  units,
  builds,
  next,
  limitFilm,
}: Pick<FilmMapProps, "units" | "builds" | "next" | "limitFilm">): string {
  const place = ({ clearance, viscosity }: { clearance: number; viscosity: number }) =>
    `${clearanceText(picometres(clearance), units)} ${clearanceUnit(units)} and ${(viscosity * 1e3).toFixed(1)} mPa·s`;
  const last = builds.at(-1);
  return [
    last
      ? `${builds.length} of this engine's builds, the last at ${place(last)}`
      : "No build of this engine yet",
    next && `the next step leads to ${place(next)}`,
    limitFilm !== undefined && `the limit line is a film of ${filmText(limitFilm)}`,
  ]
    .filter(Boolean)
    .join("; ")
    .concat(".");
}
