import { leastFilmGuides } from "~/engineering/film/least-film-guides";
import { steadyFilm } from "~/engineering/film/steady-film";
import { clearanceUnit, type PageUnits } from "~/engineering/quantity/figures";
import { format, formatWithUnit } from "~/engineering/quantity/format";
import {
  bearingFields,
  dutyFields,
  readBearing,
  readClearance,
  readDuty,
  readRoughness,
  readViscosity,
  roughnessFields,
} from "./bearing-fields.server";
import { AskedFields } from "./fields.server";

export const filmFields = [
  ...bearingFields,
  ...dutyFields,
  { name: "viscosity", label: "Viscosity in the film", hint: "mPa·s; or an oil below" },
  { name: "kv40", label: "Oil at 40 °C", hint: "mm²/s" },
  { name: "kv100", label: "Oil at 100 °C", hint: "mm²/s" },
  { name: "supplyTemperature", label: "Oil comes at", hint: "°C" },
  ...roughnessFields,
];

/** The film of a plain bearing at a steady speed and load, with what it rests on. */
export async function calculateFilm(searched: URLSearchParams, units: PageUnits) {
  const asked = new AskedFields(searched);
  const page = { typed: asked.typed, errors: asked.errors };
  if (asked.isEmpty) return { ...page, result: undefined };
  const kinematic = { kind: "kinematic-viscosity", unit: "mm2/s" } as const;
  const kv40 = await asked.quantity("kv40", kinematic);
  const kv100 = await asked.quantity("kv100", kinematic);
  const duty = {
    ...(await readBearing(asked, units)),
    clearance: await readClearance(asked, units),
    ...(await readDuty(asked)),
    viscosity: await readViscosity(asked),
    oil: kv40 !== undefined && kv100 !== undefined ? { kv40, kv100 } : undefined,
    supplyTemperatureC: await asked.quantity("supplyTemperature", { kind: "temperature", unit: "degC" }),
    roughness: await readRoughness(asked, units),
  };
  const result = asked.result(() => shown(duty, units), nameOf);
  return { ...page, result };
}

// The core names its inputs; the page has one field for the oil's two, and °C without the C.
const nameOf = (field: string) => ({ supplyTemperatureC: "supplyTemperature", oil: "kv40" })[field] ?? field;

function shown(duty: Parameters<typeof steadyFilm>[0], units: PageUnits) {
  const film = steadyFilm(duty);
  const fine = (value: number) =>
    `${format(value, units === "inch" ? "uin" : "um", units === "inch" ? 1 : 3)} ${units === "inch" ? "µin" : "µm"}`;
  const degrees = (angle: number) => `${((angle * 180) / Math.PI).toFixed(1)}°`;
  const stress = (value: number) =>
    units === "inch" ? formatWithUnit(value, "psi", 0) : formatWithUnit(value, "MPa", 2);
  const surfaceSpeed = (duty.speed * duty.diameter) / 2;
  return {
    outsideRange: film.outsideRange,
    converged: film.converged,
    rows: [
      { what: "least film", value: fine(film.leastFilm) },
      { what: "eccentricity ratio", value: film.eccentricityRatio.toFixed(4) },
      { what: "attitude angle", value: degrees(film.attitude) },
      { what: "Sommerfeld number", value: film.sommerfeld.toPrecision(4) },
      { what: "specific load", value: stress(film.specificLoad) },
      { what: "peak pressure", value: stress(film.peakPressure) },
      { what: "friction coefficient", value: film.frictionCoefficient.toPrecision(3) },
      { what: "friction power", value: `${film.frictionPower.toFixed(1)} W` },
      { what: "side flow", value: `${(film.sideFlow * 6e4).toPrecision(3)} L/min` },
      { what: "temperature rise", value: `${film.temperatureRise.toFixed(1)} °C` },
      {
        what: "temperature in the film",
        value: film.effectiveTemperatureC === null ? "–" : `${film.effectiveTemperatureC.toFixed(1)} °C`,
      },
      { what: "viscosity in the film", value: formatWithUnit(film.effectiveViscosity, "mPa s", 3) },
      { what: "film over roughness, λ", value: film.lambda === null ? "–" : film.lambda.toFixed(2) },
      { what: "regime", value: film.regime ?? "–" },
    ],
    guides: leastFilmGuides({ diameter: duty.diameter, surfaceSpeed }).map((guide) => ({
      what: guide.name,
      value: `${fine(guide.leastFilm)}${guide.doubtful ? ", doubtful" : ""}`,
      source: guide.source,
    })),
    unit: clearanceUnit(units),
    assumptions: film.assumptions,
  };
}
