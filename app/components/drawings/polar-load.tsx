import { Drawing } from "./drawing";
import { lineWeight } from "./line-weight";
import { AngleMarks, degreesOf, everyThirty, onPaper, PolarRings, thinnedOut } from "./polar-frame";
import { niceTicks, pathThrough, place } from "./scale";
import { Words } from "./text";

interface LoadAt {
  /** Rad. */
  crankAngle: number;
  /** Force of the journal on the sleeve, N: x along the rod or cylinder, y 90° ahead in the sense the crank turns. */
  x: number;
  y: number;
}

interface PolarLoadProps {
  title: string;
  /** One cycle. */
  loads: readonly LoadAt[];
  /** What x points to: "towards the wrist pin". */
  direction: string;
}

const width = 440;
const centre = { x: 220, y: 222 };
const reach = 180;

/** The load of a bearing over the cycle as the path of its tip, crank angles beside it, the greatest load named. */
export function PolarLoad({ title, loads, direction }: PolarLoadProps) {
  const greatest = loads.reduce<LoadAt | undefined>(
    (most, load) => (most && sizeOf(most) >= sizeOf(load) ? most : load),
    undefined,
  );
  if (!greatest || sizeOf(greatest) === 0) return null;
  const perNewton = reach / (sizeOf(greatest) * 1.04);
  const toPaper = onPaper(centre, perNewton);
  const kilonewtons = niceTicks(0, reach / perNewton / 1e3, 4).filter((value) => value > 0);
  const tip = toPaper(greatest);
  const said = `${kiloText(sizeOf(greatest))} kN at ${degreesOf(greatest.crankAngle)}°`;
  const tipIsLeft = tip.x < centre.x;
  return (
    <Drawing
      title={title}
      summary={`The greatest load is ${said} of crank angle.`}
      width={width}
      height={444}
      table={{
        head: ["crank angle, °", "load, kN", `${direction}, kN`, "90° ahead of it, kN"],
        rows: everyThirty(loads).map((load) => [
          degreesOf(load.crankAngle),
          kiloText(sizeOf(load)),
          kiloText(load.x),
          kiloText(load.y),
        ]),
      }}
    >
      <PolarRings
        centre={centre}
        rings={kilonewtons.map((value) => ({ radius: value * 1e3 * perNewton, text: `${value} kN` }))}
      />
      <Words x={centre.x} y={20} anchor="middle">
        ↑ {direction}
      </Words>
      <path
        d={`${pathThrough(thinnedOut(loads, 360).map(toPaper))}z`}
        strokeWidth={lineWeight.mark}
        strokeLinejoin="round"
        className="fill-none stroke-bronze"
      />
      <AngleMarks points={loads} toPaper={toPaper} />
      <circle
        cx={place(tip.x)}
        cy={place(tip.y)}
        r="5"
        strokeWidth={lineWeight.strong}
        className="fill-none stroke-layout"
      />
      <Words
        x={tip.x + (tipIsLeft ? 12 : -12)}
        y={tip.y + 4}
        anchor={tipIsLeft ? "start" : "end"}
        tone="layout"
        halo
      >
        {said}
      </Words>
    </Drawing>
  );
}

const sizeOf = ({ x, y }: LoadAt): number => Math.hypot(x, y);

const kiloText = (newtons: number): string => (newtons / 1e3).toFixed(1);
