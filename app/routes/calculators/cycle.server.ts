import { engineCycle } from "~/engineering/cycle/engine-cycle";
import { shareBelow } from "~/engineering/cycle/orbit";
import { readPressureTrace } from "~/engineering/cycle/pressure-trace";
import { diameterUnitName, type PageUnits } from "~/engineering/quantity/figures";
import { format } from "~/engineering/quantity/format";
import { bearingFields, readBearing, readClearance, readViscosity } from "./bearing-fields.server";
import { AskedFields } from "./fields.server";

export const cycleFields = [
  { name: "bore", label: "Cylinder bore" },
  { name: "stroke", label: "Stroke" },
  { name: "rodLength", label: "Rod length" },
  { name: "reciprocatingMass", label: "Reciprocating mass", hint: "g: piston, pin, rod's small end" },
  { name: "rotatingMass", label: "Rotating mass", hint: "g: rod's big end" },
  { name: "speed", label: "Speed", hint: "rpm" },
  { name: "peakPressure", label: "Peak pressure", hint: "bar or psi; blank with a trace" },
  { name: "peakAngle", label: "Its angle after top dead centre", hint: "degrees" },
  ...bearingFields,
  { name: "viscosity", label: "Viscosity in the film", hint: "mPa·s" },
  { name: "filmLimit", label: "Film to stay over", hint: "Blank: not asked" },
];

const radians = (degrees: number) => (degrees * Math.PI) / 180;
const degrees = (angle: number) => (angle * 180) / Math.PI;

/** The big end of an engine over its cycle: its loads, its orbit and its least film. */
export async function calculateCycle(searched: URLSearchParams, units: PageUnits) {
  const asked = new AskedFields(searched);
  const page = { typed: asked.typed, errors: asked.errors };
  if (asked.isEmpty) return { ...page, result: undefined };
  const length = { kind: "length", unit: diameterUnitName(units) } as const;
  const trace = asked.typed.trace?.trim() ?? "";
  const mass = { kind: "mass", unit: "g" } as const;
  const cylinder = {
    bore: await asked.required("bore", length),
    stroke: await asked.required("stroke", length),
    rodLength: await asked.required("rodLength", length),
    reciprocatingMass: await asked.required("reciprocatingMass", mass),
    rotatingMass: await asked.required("rotatingMass", mass),
    speed: await asked.required("speed", { kind: "speed", unit: "rpm" }),
  };
  const pressure = { kind: "pressure", unit: "bar" } as const;
  const peakPressure = trace ? 0 : await asked.required("peakPressure", pressure);
  const peakAngle = radians(asked.number("peakAngle") ?? 12);
  const bearing = { ...(await readBearing(asked, units)), clearance: await readClearance(asked, units) };
  const viscosity = (await readViscosity(asked)) ?? Number.NaN;
  if (Number.isNaN(viscosity))
    await asked.required("viscosity", { kind: "dynamic-viscosity", unit: "mPa s" });
  const filmLimit = await asked.quantity("filmLimit", { kind: "finish", unit: "um" });
  const result = asked.result(
    () => {
      const gas = trace
        ? { pressureTrace: readPressureTrace(trace, { pressure: "bar", zero: 0 }) }
        : { peakPressure, peakAngle };
      return shown(engineCycle({ engine: { ...cylinder, ...gas }, bearing, viscosity }), filmLimit, units);
    },
    (field) => field.replace(/^(engine|bearing)\./, ""),
  );
  return { ...page, result };
}

function shown(cycle: ReturnType<typeof engineCycle>, filmLimit: number | undefined, units: PageUnits) {
  const fine = (value: number) =>
    units === "inch" ? `${format(value, "uin", 1)} µin` : `${format(value, "um", 3)} µm`;
  const largest = Math.max(...cycle.loads.map(({ x, y }) => Math.hypot(x, y)));
  return {
    outsideRange: cycle.outsideRange,
    converged: cycle.converged,
    rows: [
      { what: "least film", value: fine(cycle.leastFilm) },
      { what: "at crank angle", value: `${degrees(cycle.leastFilmAngle).toFixed(0)}°` },
      { what: "largest load", value: `${(largest / 1e3).toFixed(2)} kN` },
      { what: "mean power loss", value: `${cycle.meanPower.toFixed(0)} W` },
      ...(filmLimit === undefined
        ? []
        : [
            {
              what: `share of the cycle under ${fine(filmLimit)}`,
              value: `${(100 * shareBelow(cycle.orbit, filmLimit)).toFixed(1)} %`,
            },
          ]),
      ...(cycle.gas
        ? [{ what: "compression ratio taken", value: cycle.gas.compressionRatio.toFixed(1) }]
        : []),
    ],
    filmLimit,
    loads: every(cycle.loads, 3).map(({ crankAngle, x, y }) => ({
      crankAngle,
      x: Math.round(x),
      y: Math.round(y),
    })),
    orbit: every(cycle.orbit, 3).map(({ crankAngle, ex, ey, film }) => ({
      crankAngle,
      ex: Number(ex.toFixed(4)),
      ey: Number(ey.toFixed(4)),
      film: Number(film.toPrecision(4)),
    })),
  };
}

// Every third degree draws the same line with a third of the figures; the results above are of all of them.
const every = <Item>(items: readonly Item[], step: number) => items.filter((_, index) => index % step === 0);
