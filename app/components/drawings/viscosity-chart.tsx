import { viscosityLine } from "~/engineering/oil/viscosity";
import { BottomAxis, LeftAxis } from "./axis";
import { Drawing } from "./drawing";
import { stackApart } from "./keep-apart";
import { lineWeight } from "./line-weight";
import { oilTone } from "./oil-tone";
import { linearScale, pathThrough, place } from "./scale";
import { cutTo, Figure, Words } from "./text";

interface ChartOil {
  name: string;
  /** Kinematic viscosity at 40 and 100 °C, mm²/s. */
  kv40: number;
  kv100: number;
  /** Temperature that it ran at, °C. */
  ranAtC?: number | undefined;
}

interface ViscosityChartProps {
  title: string;
  oils: readonly ChartOil[];
}

const width = 730;
const left = 52;
const right = 540;
const top = 30;
const floor = 350;
const coldest = 20;
const hottest = 150;
const temperatures = [20, 40, 60, 80, 100, 120, 150];
const viscosities = [2, 3, 5, 7, 10, 15, 20, 30, 50, 100, 200, 500, 1000, 2000];

// The axes of ASTM D341, on which an oil is a straight line: log of temperature in K across, log log of (ν + 0.7) up.
const across = (temperatureC: number) => Math.log10(temperatureC + 273.15);
const up = (kinematic: number) => Math.log10(Math.log10(kinematic + 0.7));

/** Kinematic viscosity of oils over temperature, on axes that make each of them a straight line. */
export function ViscosityChart({ title, oils }: ViscosityChartProps) {
  const lines = oils.map((oil) => ({
    ...oil,
    at: viscosityLine({ temperatureC: 40, kinematic: oil.kv40 }, { temperatureC: 100, kinematic: oil.kv100 }),
  }));
  if (lines.length === 0) return null;
  const thin = Math.min(...lines.map(({ at }) => at(hottest)));
  const thick = Math.max(...lines.map(({ at }) => at(coldest)));
  const scaleX = linearScale(across(coldest), across(hottest), left, right);
  const scaleY = linearScale(up(thin * 0.93), up(thick * 1.08), floor, top);
  const x = (temperatureC: number) => scaleX(across(temperatureC));
  const y = (kinematic: number) => scaleY(up(kinematic));
  const labelHeights = stackApart(
    lines.map(({ at }) => y(at(hottest))),
    18,
    top,
    floor,
  );
  return (
    <Drawing
      title={title}
      summary={summaryOf(oils)}
      width={width}
      height={floor + 42}
      table={{
        head: ["oil", "at 40 °C, mm²/s", "at 100 °C, mm²/s", "ran at, °C", "there, mm²/s"],
        rows: lines.map(({ name, kv40, kv100, ranAtC, at }) => [
          name,
          kv40.toFixed(1),
          kv100.toFixed(2),
          ranAtC?.toFixed(0) ?? "–",
          ranAtC === undefined ? "–" : at(ranAtC).toFixed(1),
        ]),
      }}
    >
      <LeftAxis
        ticks={viscosities
          .filter((value) => value >= thin * 0.93 && value <= thick * 1.08)
          .map((value) => ({ value, text: String(value) }))}
        scale={y}
        left={left}
        right={right}
        top={top}
        floor={floor}
        label="kinematic viscosity, mm²/s"
      />
      <BottomAxis
        ticks={temperatures.map((value) => ({ value, text: String(value) }))}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label="oil temperature, °C"
      />
      {lines.map((line, index) => (
        <OilLine key={line.name} oil={line} x={x} y={y} labelY={labelHeights[index]!} />
      ))}
    </Drawing>
  );
}

interface OilLineProps {
  oil: ChartOil & { at: (temperatureC: number) => number };
  x: (temperatureC: number) => number;
  y: (kinematic: number) => number;
  labelY: number;
}

/** One oil: a stripe in its tone between bronze edges, its two measured points, where it ran, its name at the end. */
function OilLine({ oil: { name, kv40, kv100, ranAtC, at }, x, y, labelY }: OilLineProps) {
  const ends = pathThrough([
    { x: x(coldest), y: y(at(coldest)) },
    { x: x(hottest), y: y(at(hottest)) },
  ]);
  const end = { x: x(hottest), y: y(at(hottest)) };
  return (
    <g>
      <path d={ends} strokeWidth="5" className="stroke-bronze" />
      <path d={ends} strokeWidth="3" stroke={oilTone(kv100)} />
      {[
        { temperatureC: 40, kinematic: kv40 },
        { temperatureC: 100, kinematic: kv100 },
      ].map(({ temperatureC, kinematic }) => (
        <circle
          key={temperatureC}
          cx={place(x(temperatureC))}
          cy={place(y(kinematic))}
          r="4"
          strokeWidth={lineWeight.mark}
          className="fill-plate stroke-bronze"
        />
      ))}
      {ranAtC !== undefined && (
        <g>
          <path d={`M${place(x(ranAtC))} ${place(y(at(ranAtC)) - 4)}l-5.5 -9h11z`} className="fill-layout" />
          <Figure x={x(ranAtC) + 8} y={y(at(ranAtC)) - 8} size={11} tone="layout" halo>
            {ranAtC.toFixed(0)} °C
          </Figure>
        </g>
      )}
      <path
        d={pathThrough([
          { x: end.x + 4, y: end.y },
          { x: end.x + 18, y: labelY },
        ])}
        strokeWidth={lineWeight.hair}
        className="stroke-line-strong"
      />
      <Words x={end.x + 22} y={labelY + 4} tone="ink">
        {cutTo(name, width - end.x - 26)}
      </Words>
    </g>
  );
}

function summaryOf(oils: readonly ChartOil[]): string {
  const order = [...oils].sort((a, b) => a.kv100 - b.kv100);
  const [thinnest, thickest] = [order[0]!, order.at(-1)!];
  if (oils.length === 1) {
    return `${thinnest.name}: ${thinnest.kv40.toFixed(1)} mm²/s at 40 °C, ${thinnest.kv100.toFixed(2)} at 100 °C.`;
  }
  return `${oils.length} oils; at 100 °C the thinnest is ${thinnest.name} with ${thinnest.kv100.toFixed(2)} mm²/s, the thickest ${thickest.name} with ${thickest.kv100.toFixed(2)}.`;
}
