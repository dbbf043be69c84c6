import { describe, expect, test } from "vitest";
import { EngineeringError } from "../engineering-error";
import { degrees } from "./crank-angle";
import { firingAngles } from "./crank-layout";
import { crankOf, usualLayout, usualLayouts } from "./engine-layouts";

const throwsOf = (name: string) => {
  const layout = usualLayouts.find((each) => each.name === name)!;
  const { throws } = crankOf(layout, 2);
  return throws.map(({ angle }) => Math.round(((angle - throws[0]!.angle) / degrees + 720) % 360) % 360);
};

describe("usual engines", () => {
  test.each(usualLayouts)("$name fires in its order, and evenly unless it says otherwise", (layout) => {
    const fires = firingAngles(crankOf(layout, 2));
    const inOrder = layout.firingOrder.map((number) => Math.round(fires[number - 1]! / degrees));
    expect(inOrder).toEqual(
      layout.uneven ?? layout.firingOrder.map((_, place) => (place * 720) / layout.cylinders),
    );
  });

  // Crank shapes as every engine book draws them (from memory: C. F. Taylor, vol. 2, ch. 8).
  test.each([
    ["Inline 4", [0, 180, 180, 0]],
    ["Inline 6", [0, 240, 120, 120, 240, 0]],
    ["V8, 90°, cross-plane", [0, 90, 270, 180]],
    ["V8, 90°, flat-plane", [0, 180, 180, 0]],
    ["V12, 60°", [0, 240, 120, 120, 240, 0]],
    ["Flat 2", [0, 180]],
    ["Flat 4", [0, 180, 180, 0]],
  ])("%s has its throws at %j", (name, angles) => {
    expect(throwsOf(name)).toEqual(angles);
  });

  test("two rods share a throw in a V8, none in a V6 of six throws", () => {
    expect(crankOf(usualLayout("V", 8), 5).throws).toHaveLength(4);
    expect(crankOf(usualLayout("V", 6), 4).throws).toHaveLength(6);
  });

  test("what is not usual is asked for", () => {
    expect(() => usualLayout("V", 16)).toThrow(EngineeringError);
  });
});

describe("a crank laid out by hand", () => {
  const inlineFour = {
    axes: [0, 0, 0, 0],
    throws: [0, 180, 180, 0].map((angle, index) => ({ angle: angle * degrees, cylinders: [index + 1] })),
    mains: 5,
  };

  test("fires where throws and order say", () => {
    const fires = firingAngles({ ...inlineFour, firingOrder: [1, 3, 4, 2] });
    expect(fires.map((angle) => Math.round(angle / degrees))).toEqual([0, 540, 180, 360]);
  });

  test.each([
    ["an order that needs three turns", { firingOrder: [1, 4, 2, 3] }, "firing-order"],
    ["an order that leaves one out", { firingOrder: [1, 3, 4, 4] }, "firing-order"],
    ["a cylinder without a throw", { throws: inlineFour.throws.slice(1) }, "crank-layout"],
  ])("%s is refused", (_, change, code) => {
    const layout = { ...inlineFour, firingOrder: [1, 3, 4, 2], ...change };
    expect(() => firingAngles(layout)).toThrow(expect.objectContaining({ code }));
  });
});
