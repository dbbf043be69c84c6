import { describe, expect, test } from "vitest";
import { leastFilmGuides } from "~/engineering/film/least-film-guides";
import { solveReynolds } from "~/engineering/film/reynolds";
import { filmParameter } from "~/engineering/film/roughness";
import { steadyFilm } from "~/engineering/film/steady-film";
import { oilFromPoints } from "~/engineering/oil/viscosity";

const away = (value: number, print: number) => Math.abs(value / print - 1);
const inch = 0.0254;
const pound = 4.4482216152605;
const psi = 6894.757293168;
const cubicInch = inch ** 3;
const reyn = psi; // Pa·s
const btu = 1055.05585262;
const fahrenheit = (temperatureC: number) => 1.8 * temperatureC + 32;
const celsius = (temperatureF: number) => (temperatureF - 32) / 1.8;

// Shigley's Mechanical Engineering Design, examples 12-1 to 12-4: inputs as commonly printed, answers from memory and
// read off charts, so 3 %. The chart's 0.42 for the film stands for 0.427.
describe("Shigley, examples 12-1 to 12-4", () => {
  const film = steadyFilm({
    diameter: 1.5 * inch,
    length: 1.5 * inch,
    clearance: 2 * 0.0015 * inch,
    speed: 30 * 2 * Math.PI,
    load: 500 * pound,
    viscosity: 4e-6 * reyn,
  });
  const degrees = 180 / Math.PI;
  const { peakAngle, filmEnd } = solveReynolds({
    eccentricityRatio: film.eccentricityRatio,
    lengthToDiameter: 1,
  });
  const loadLine = 180 - film.attitude * degrees;

  test.each([
    ["specific load, psi", film.specificLoad / psi, 222.2],
    ["Sommerfeld number", film.sommerfeld, 0.135],
    ["least film, in", film.leastFilm / inch, 0.00063],
    ["eccentricity ratio", film.eccentricityRatio, 0.58],
    ["attitude, degrees", film.attitude * degrees, 53],
    ["friction coefficient", film.frictionCoefficient, 0.007],
    ["torque, lbf in", (film.frictionForce * 0.75 * inch) / (pound * inch), 2.62],
    ["heat, Btu/s", film.frictionPower / btu, 0.0529],
    ["inflow, in³/s", film.inflow / cubicInch, 0.217],
    ["side flow, in³/s", film.sideFlow / cubicInch, 0.142],
    ["peak pressure, psi", film.peakPressure / psi, 529],
    ["angle of the peak from the load line", peakAngle * degrees - loadLine, 18.5],
    ["angle of the film's end from the load line", filmEnd * degrees - loadLine, 75],
  ])("%s", (_, value, print) => {
    expect(away(value, print)).toBeLessThan(0.03);
  });
});

// Shigley, example 12-5 (seen in a public solution): a self-contained bearing; its balance with the housing is not ours,
// so its film viscosity of 1.08 µreyn is taken and the film's numbers checked; read off charts, 3 %.
test("Shigley, example 12-5: the film at its viscosity", () => {
  const film = steadyFilm({
    diameter: 2 * inch,
    length: 2 * inch,
    clearance: 2 * 0.001 * inch,
    speed: 15 * 2 * Math.PI,
    load: 100 * pound,
    viscosity: 1.08e-6 * reyn,
  });
  expect(away(film.sommerfeld, 0.65)).toBeLessThan(0.03);
  expect(away(film.leastFilm / inch, 0.00079)).toBeLessThan(0.03);
  expect(away(film.frictionCoefficient, 0.0128)).toBeLessThan(0.03);
  expect(away((film.frictionForce * inch) / (pound * inch), 1.28)).toBeLessThan(0.03);
});

// Shigley, example 12-6: inputs seen, answers from memory and read off charts: 3 % and half the last printed digit. Its
// SAE 20 (A. Seireg & S. Dandage 1982, seen: µ = 0.0136 µreyn exp(1271.6/(t + 95)), t in °F) is taken at 60 and 90 °C,
// and the density of its oil, 0.0311 lb/in³, holds at the bearing's temperature.
test("Shigley, example 12-6: pressure-fed through a groove all round, heat balanced", () => {
  const vogel = (temperatureC: number) =>
    0.0136e-6 * Math.exp(1271.6 / (fahrenheit(temperatureC) + 95)) * reyn;
  const density = 861;
  const density15 = 899; // so that it is 861 kg/m³ at 76 °C
  const kinematic = (temperatureC: number) =>
    (vogel(temperatureC) / (density * (1 - 0.00073 * (temperatureC - 76)))) * 1e6;
  const point = (temperatureC: number) => ({ temperatureC, kinematic: kinematic(temperatureC) });
  const width = 0.25 * inch;
  const film = steadyFilm({
    diameter: 1.75 * inch,
    length: 2 * 0.875 * inch + width,
    clearance: 2 * 0.0015 * inch,
    speed: 50 * 2 * Math.PI,
    load: 900 * pound,
    oil: oilFromPoints(point(60), point(90), { density15 }),
    supplyTemperatureC: celsius(120),
    feed: { kind: "groove", width },
    supplyPressure: 30 * psi,
  });
  expect(away(film.specificLoad / psi, 293.9)).toBeLessThan(0.001);
  expect(away(fahrenheit(film.effectiveTemperatureC!) - 120, 168.5 - 120)).toBeLessThan(0.03);
  expect(away(1.8 * film.temperatureRise, 97.1)).toBeLessThan(0.03);
  expect(Math.abs(film.leastFilm / inch - 0.0003)).toBeLessThan(0.03 * 0.0003 + 0.00005);
  expect(away(film.pressureFlow / cubicInch, 0.123)).toBeLessThan(0.03);
  expect(away(film.frictionPower / btu, 0.156)).toBeLessThan(0.03);
});

// Temperature rise after Raimondi and Boyd as Shigley fits it for L/D 1 (coefficients seen): 0.120 ΔT/P = 0.349109 +
// 6.0094 S + 0.047467 S², ΔT in K, P in MPa. The fit itself is 1 to 4 % from the table, so 5 %.
test.each([0.05, 0.1, 0.2, 0.4, 0.7, 1])("Shigley's fit of the temperature rise at S %d", (sommerfeld) => {
  const specificLoad = 1.5e6;
  const viscosity = (sommerfeld * specificLoad) / (1000 ** 2 * 30);
  const { temperatureRise } = steadyFilm({
    diameter: 0.05,
    length: 0.05,
    clearance: 50e-6,
    speed: 30 * 2 * Math.PI,
    specificLoad,
    viscosity,
  });
  const fit = (0.349109 + 6.0094 * sommerfeld + 0.047467 * sommerfeld ** 2) / 0.12;
  expect(away(temperatureRise, fit * 1.5)).toBeLessThan(0.05);
});

// U. C. Jindal, Machine Design, example 17-2 (seen in a public solution): the viscosity for a film of 8 µm.
test("Jindal, example 17-2", () => {
  const film = steadyFilm({
    diameter: 0.06,
    length: 0.06,
    clearance: 2 * 0.04e-3,
    speed: (1260 * 2 * Math.PI) / 60,
    load: 6000,
    viscosity: 6.293e-3,
  });
  expect(away(film.leastFilm, 0.008e-3)).toBeLessThan(0.03);
});

// From memory, the definition seen: λ of a 1 µm film between Rq 0.2 and 0.3 µm is 2.7735; exact arithmetic.
test("the film parameter of a worked case", () => {
  const meanOf = (rootMeanSquare: number) => rootMeanSquare / 1.2533141373155;
  expect(filmParameter(1e-6, { bore: meanOf(0.2e-6), journal: meanOf(0.3e-6) })).toBeCloseTo(2.77350098, 8);
});

// Trumpler's rule, h₀ ≥ 0.0002 in + 0.00004 d (metric form seen): exact.
test.each([
  [1, 0.00024, 6.096],
  [2, 0.00028, 7.112],
  [2.5, 0.0003, 7.62],
  [3, 0.00032, 8.128],
])("Trumpler's least film of a %d in journal", (diameter, inches, micrometres) => {
  const [guide] = leastFilmGuides({ diameter: diameter * inch, surfaceSpeed: 5 });
  expect(guide).toMatchObject({ name: "Trumpler", doubtful: false });
  expect(guide!.leastFilm / inch).toBeCloseTo(inches, 9);
  expect(guide!.leastFilm * 1e6).toBeCloseTo(micrometres, 6);
});

// From memory and unseen: the table is carried, and says of itself that it is in doubt.
test("the least films of ISO 7902-3 are given as doubtful", () => {
  const guide = (diameter: number, surfaceSpeed: number) =>
    leastFilmGuides({ diameter, surfaceSpeed }).find(({ name }) => name === "ISO 7902-3");
  expect(guide(0.053, 20)).toMatchObject({ leastFilm: 7e-6, doubtful: true });
  expect(guide(0.1, 2)).toMatchObject({ leastFilm: 5e-6, doubtful: true });
  expect(guide(0.02, 20)).toBeUndefined();
});
