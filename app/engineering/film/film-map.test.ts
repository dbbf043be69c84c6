import { expect, test } from "vitest";
import { filmMap } from "./film-map";
import { steadyFilm } from "./steady-film";

const duty = {
  diameter: 0.05334,
  length: 0.022,
  speed: 750,
  load: 9000,
  roughness: { bore: 2e-7, journal: 1e-7 },
};
const clearances = { from: 30e-6, to: 90e-6, count: 7 };
const viscosities = { from: 0.004, to: 0.02, count: 5 };

test("every point of the map is the steady film there", () => {
  const map = filmMap({ ...duty, clearances, viscosities });
  expect(map.clearances).toHaveLength(7);
  expect(map.leastFilm[3]).toHaveLength(5);
  map.clearances.forEach((clearance, row) => {
    map.viscosities.forEach((viscosity, column) => {
      const film = steadyFilm({ ...duty, clearance, viscosity });
      expect(map.leastFilm[row]![column]).toBe(film.leastFilm);
      expect(map.frictionPower[row]![column]).toBe(film.frictionPower);
      expect(map.sideFlow[row]![column]).toBe(film.sideFlow);
      expect(map.temperatureRise[row]![column]).toBe(film.temperatureRise);
      expect(map.lambda![row]![column]).toBeCloseTo(film.lambda!, 12);
    });
  });
  expect(map.clearances.at(-1)).toBeCloseTo(90e-6, 18);
});

test("without roughness there is no film parameter", () => {
  const { roughness: _, ...bare } = duty;
  expect(filmMap({ ...bare, clearances, viscosities }).lambda).toBeNull();
});

test.each([
  [{ clearances: { from: 0, to: 9e-5, count: 7 } }, "clearances.from"],
  [{ clearances: { from: 9e-5, to: 3e-5, count: 7 } }, "clearances.to"],
  [{ clearances: { from: 3e-5, to: 9e-5, count: 1 } }, "clearances.count"],
  [{ viscosities: { from: 0.004, to: 0.02, count: 1e9 } }, "viscosities.count"],
  [{ viscosities: { from: 0.004, to: Number.NaN, count: 5 } }, "viscosities.to"],
  [{ viscosities: { from: 0.004, to: 0.02, count: Number.NaN } }, "viscosities.count"],
])("refuses the axis %o", (wrong, field) => {
  expect(() => filmMap({ ...duty, clearances, viscosities, ...wrong })).toThrow(
    expect.objectContaining({ field }),
  );
});
