import { BottomAxis, LeftAxis } from "./axis";
import { plainTicks } from "./clearance-axis";
import { Drawing } from "./drawing";
import { filmText } from "./film-levels";
import { lineWeight } from "./line-weight";
import { AngleMarks, degreesOf, everyThirty, onPaper, PolarRings, thinnedOut } from "./polar-frame";
import { linearScale, pathThrough, place } from "./scale";
import { Words } from "./text";

interface OrbitAt {
  /** Rad. */
  crankAngle: number;
  /** Eccentricity ratio along the rod or cylinder, and 90° ahead of it in the sense the crank turns. */
  ex: number;
  ey: number;
  /** Least film at this angle, m. */
  film: number;
}

interface OrbitDrawingProps {
  title: string;
  /** One cycle. */
  orbit: readonly OrbitAt[];
  /** What ex points to: "towards the wrist pin". */
  direction: string;
  /** The least film that this fit is allowed, m. */
  limitFilm?: number | undefined;
}

const width = 800;
const centre = { x: 160, y: 176 };
const reach = 140;
const left = 380;
const right = width - 14;
const top = 36;
const floor = 316;

/** The path of a journal inside its clearance over the cycle, and the least film at each crank angle beside it. */
export function OrbitDrawing({ title, orbit, direction, limitFilm }: OrbitDrawingProps) {
  const least = orbit.reduce<OrbitAt | undefined>(
    (thinnest, point) => (thinnest && thinnest.film <= point.film ? thinnest : point),
    undefined,
  );
  if (!least) return null;
  const said = `${filmText(least.film)} at ${degreesOf(least.crankAngle)}°`;
  return (
    <Drawing
      title={title}
      summary={`The least film is ${said} of crank angle${limitFilm === undefined ? "" : `; the limit is ${filmText(limitFilm)}`}.`}
      width={width}
      height={floor + 42}
      table={{
        head: ["crank angle, °", "least film, µm", "eccentricity ratio", `${direction}`, "90° ahead of it"],
        rows: everyThirty(orbit).map(({ crankAngle, ex, ey, film }) => [
          degreesOf(crankAngle),
          (film * 1e6).toFixed(2),
          Math.hypot(ex, ey).toFixed(3),
          ex.toFixed(3),
          ey.toFixed(3),
        ]),
      }}
    >
      <OrbitInClearance orbit={orbit} least={least} direction={direction} />
      <FilmOverCycle orbit={orbit} least={least} said={said} limitFilm={limitFilm} />
    </Drawing>
  );
}

interface PartProps {
  orbit: readonly OrbitAt[];
  least: OrbitAt;
}

function OrbitInClearance({ orbit, least, direction }: PartProps & { direction: string }) {
  const toPaper = onPaper(centre, reach);
  const inClearance = ({ ex, ey }: OrbitAt) => toPaper({ x: ex, y: ey });
  const thinnest = inClearance(least);
  return (
    <g>
      <PolarRings
        centre={centre}
        rings={[0.5, 1].map((ratio) => ({ radius: ratio * reach, text: ratio === 1 ? "" : "ε 0.5" }))}
      />
      <circle
        cx={centre.x}
        cy={centre.y}
        r={reach}
        strokeWidth={lineWeight.strong}
        className="fill-none stroke-line-strong"
      />
      <Words x={centre.x} y={18} anchor="middle">
        ↑ {direction}
      </Words>
      <path
        d={`${pathThrough(thinnedOut(orbit, 360).map(inClearance))}z`}
        strokeWidth={lineWeight.mark}
        strokeLinejoin="round"
        className="fill-none stroke-bronze"
      />
      <AngleMarks points={orbit} toPaper={inClearance} />
      <circle
        cx={place(thinnest.x)}
        cy={place(thinnest.y)}
        r="5"
        strokeWidth={lineWeight.strong}
        className="fill-none stroke-layout"
      />
      <Words x={centre.x} y={centre.y + reach + 26} anchor="middle">
        the journal's centre inside the clearance
      </Words>
    </g>
  );
}

function FilmOverCycle({
  orbit,
  least,
  said,
  limitFilm,
}: PartProps & { said: string; limitFilm: number | undefined }) {
  const most = Math.max(...orbit.map(({ film }) => film), limitFilm ?? 0);
  const end = Math.max(degreesOf(orbit.at(-1)!.crankAngle), 360);
  const degrees = { from: 0, to: end > 360 ? 720 : 360 };
  const x = linearScale(degrees.from, degrees.to, left, right);
  const y = linearScale(0, Math.max(most, 1e-9) * 1.05, floor, top);
  const path = pathThrough(
    thinnedOut(orbit, 360).map(({ crankAngle, film }) => ({
      x: x((crankAngle * 180) / Math.PI),
      y: y(film),
    })),
  );
  const thinnest = { x: x((least.crankAngle * 180) / Math.PI), y: y(least.film) };
  const isRight = thinnest.x > (left + right) / 2;
  return (
    <g>
      <LeftAxis
        ticks={plainTicks({ from: 0, to: most * 1e6 }, 5).map(({ value, text }) => ({
          value: value / 1e6,
          text,
        }))}
        scale={y}
        left={left}
        right={right}
        top={top - 10}
        floor={floor}
        label="least film, µm"
      />
      <BottomAxis
        ticks={[0, 90, 180, 270, 360, 450, 540, 630, 720]
          .filter((value) => value <= degrees.to)
          .map((value) => ({ value, text: String(value) }))}
        scale={x}
        from={left}
        to={right}
        floor={floor}
        label="crank angle, °"
      />
      {limitFilm !== undefined && (
        <path
          d={`M${left} ${place(y(limitFilm))}H${right}`}
          strokeWidth={lineWeight.strong}
          strokeDasharray="6 4"
          className="stroke-stop"
        />
      )}
      <path d={path} strokeWidth={lineWeight.mark} className="fill-none stroke-bronze" />
      <circle
        cx={place(thinnest.x)}
        cy={place(thinnest.y)}
        r="5"
        strokeWidth={lineWeight.strong}
        className="fill-none stroke-layout"
      />
      <path
        d={`M${place(thinnest.x)} ${place(thinnest.y - 6)}V${top + 4}`}
        strokeWidth={lineWeight.hair}
        strokeDasharray="2 3"
        className="stroke-layout"
      />
      <Words
        x={thinnest.x + (isRight ? -5 : 5)}
        y={top + 8}
        anchor={isRight ? "end" : "start"}
        tone="layout"
        halo
      >
        {said}
      </Words>
    </g>
  );
}
