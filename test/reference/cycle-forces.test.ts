import { describe, expect, test } from "vitest";
import { bigEndLoad } from "~/engineering/cycle/big-end-load";
import { firingAngles } from "~/engineering/cycle/crank-layout";
import { type EngineDuty, engineCycle } from "~/engineering/cycle/engine-cycle";
import { crankOf, type UsualLayout, usualLayout, usualLayouts } from "~/engineering/cycle/engine-layouts";
import { ambientPressure, gasPressure } from "~/engineering/cycle/gas-pressure";
import { mainLoads } from "~/engineering/cycle/main-load";
import { sliderCrank } from "~/engineering/cycle/slider-crank";

const rpm = Math.PI / 30;
const degrees = Math.PI / 180;
const everyDegree = Array.from({ length: 720 }, (_, index) => index * degrees);

// Throw 45 mm, rod 150 mm, 6000 rpm, 0.55 kg and 0.40 kg: figures computed outside the project.
const speed = 6000 * rpm;
const cylinder = { bore: 0.1, stroke: 0.09, rodLength: 0.15, reciprocatingMass: 0.55, rotatingMass: 0.4 };
const withoutGas = (crankAngle: number) => bigEndLoad(cylinder, crankAngle, speed, 0);

describe("inertia load of a big end", () => {
  test("at top dead centre: 12 702.18 N reciprocating and 7106.115 N rotating pull on the cap", () => {
    expect(withoutGas(0).x).toBeCloseTo(-19_808.3, 0);
    expect(withoutGas(0).y).toBeCloseTo(0, 9);
    expect(bigEndLoad({ ...cylinder, rotatingMass: 0 }, 0, speed, 0).x).toBeCloseTo(-12_702.18, 2);
    expect(bigEndLoad({ ...cylinder, reciprocatingMass: 0 }, 0, speed, 0).x).toBeCloseTo(-7106.115, 3);
  });

  test("at bottom dead centre the two oppose: 0.55 kg × 12 435.702 m/s² less 7106.115 N, on the rod's shell", () => {
    // The rotating mass now pulls away from the pin, which is again the shell's side seen from the rod.
    expect(withoutGas(Math.PI).x).toBeCloseTo(0.55 * 12_435.702 + 7106.115, 1);
  });
});

describe("work over a cycle", () => {
  // Principle of work: what the gas does on the piston turns up at the crank, since masses give back over a cycle what
  // they take. Sums over a smooth cycle at 1° leave 0.1 % (the pressure has kinks at its peak and at exhaust opening).
  test.each([0, 0.0015, -0.002])(
    "of gas on the piston equals that on the crank, pin offset %d m",
    (pinOffset) => {
      const gas = { peakPressure: 90e5, peakAngle: 14 * degrees };
      const crank = { ...cylinder, pinOffset };
      const { at } = gasPressure(crank, gas);
      const area = (Math.PI / 4) * cylinder.bore ** 2;
      let onPiston = 0;
      let onCrank = 0;
      for (const crankAngle of everyDegree) {
        const force = area * (at(crankAngle) - ambientPressure);
        const load = bigEndLoad(crank, crankAngle, speed, force);
        const [sine, cosine] = [Math.sin(load.frameAngle), Math.cos(load.frameAngle)];
        const [forceX, forceY] = [-(load.x * cosine - load.y * sine), -(load.x * sine + load.y * cosine)];
        const torque = 0.045 * (Math.cos(crankAngle) * forceY - Math.sin(crankAngle) * forceX);
        onCrank += torque * degrees;
        onPiston += (force * sliderCrank(crank, crankAngle, speed).velocity * degrees) / speed;
      }
      expect(onPiston).toBeGreaterThan(500);
      expect(Math.abs(onCrank / onPiston - 1)).toBeLessThan(1e-3);
    },
  );
});

describe("inertia forces on the block: mains and cylinder walls together", () => {
  // Balance of usual engines: C. F. Taylor, The Internal-Combustion Engine, vol. 2, ch. 8 (from memory). Sizes are
  // harmonics of the crank's turn; λ = throw / rod. A force that cancels may leave rounding only.
  const pistonOnly = { ...cylinder, rotatingMass: 0 };
  const lambda = 0.3;
  const primary = 0.55 * 0.045 * speed ** 2;
  const secondary = primary * (lambda + lambda ** 3 / 4 + (15 * lambda ** 5) / 128);

  /** What a rod pushes sideways at its pin it pulls at the crank, so the walls belong to the sum. */
  const blockForce = (layout: UsualLayout, mains: number, throwMassMoment = 0): Force[] => {
    const crank = crankOf(layout, mains);
    const load = (angle: number) => bigEndLoad(pistonOnly, angle, speed, 0);
    const onMains = mainLoads(crank, load, speed, { throwMassMoment });
    const fires = firingAngles(crank);
    return everyDegree.map((crankAngle, index) => {
      const onWalls = crank.axes.map((axis, place) => {
        const { x, frameAngle } = load(crankAngle - fires[place]!);
        return {
          x: -x * Math.sin(frameAngle) * Math.sin(axis),
          y: x * Math.sin(frameAngle) * Math.cos(axis),
        };
      });
      const all = [...onMains.map((main) => main[index]!), ...onWalls];
      return { x: sum(all, "x"), y: sum(all, "y") };
    });
  };

  test("an inline four shakes at second order with four times one cylinder's force, and not at first", () => {
    const force = blockForce(usualLayout("inline", 4), 5);
    expect(harmonic(force, "x", 1)).toBeLessThan(1e-6 * primary);
    // 1e-4: the series of the second harmonic stops at λ⁵.
    expect(Math.abs(harmonic(force, "x", 2) / (4 * secondary) - 1)).toBeLessThan(1e-4);
    expect(harmonic(force, "y", 2)).toBeLessThan(1e-6 * primary);
  });

  test.each([
    ["inline", 6, 7],
    ["flat", 4, 5],
    ["flat", 6, 7],
    ["V", 12, 7],
  ] as const)("%s %d is free of first and second order", (form, cylinders, mains) => {
    const force = blockForce(usualLayout(form, cylinders), mains);
    for (const order of [1, 2]) {
      expect(harmonic(force, "x", order)).toBeLessThan(1e-6 * primary);
      expect(harmonic(force, "y", order)).toBeLessThan(1e-6 * primary);
    }
  });

  test("a cross-plane V8 is free of second order too; a flat-plane one shakes sideways at 4√2 times", () => {
    const cross = blockForce(usualLayout("V", 8), 5);
    expect(harmonic(cross, "x", 2) + harmonic(cross, "y", 2)).toBeLessThan(1e-6 * primary);
    const flat = blockForce(usualLayouts.find((layout) => layout.name.includes("flat-plane"))!, 5);
    expect(harmonic(flat, "x", 2)).toBeLessThan(1e-6 * primary);
    expect(Math.abs(harmonic(flat, "y", 2) / (4 * Math.SQRT2 * secondary) - 1)).toBeLessThan(1e-4);
  });

  test("a 90° V2's first order turns with the throw, and a counterweight takes it away", () => {
    const force = blockForce(usualLayout("V", 2), 2);
    expect(Math.abs(harmonic(force, "x", 1) / primary - 1)).toBeLessThan(1e-9);
    expect(Math.abs(harmonic(force, "y", 1) / primary - 1)).toBeLessThan(1e-9);
    const balanced = blockForce(usualLayout("V", 2), 2, -0.55 * 0.045);
    expect(harmonic(balanced, "x", 1) + harmonic(balanced, "y", 1)).toBeLessThan(1e-6 * primary);
  });
});

describe("a whole engine", () => {
  test("the polar load of a big end: gas on the shell at firing, inertia on the cap at the other dead centre", () => {
    const engine: EngineDuty = {
      ...cylinder,
      speed: 3000 * rpm,
      peakPressure: 90e5,
      peakAngle: 14 * degrees,
    };
    const { loads } = engineCycle({
      engine,
      bearing: { diameter: 0.0533, length: 0.022, clearance: 63e-6 },
      viscosity: 0.01,
    });
    // At the peak: (p − p0) A less the masses at 3000 rpm, a quarter of the figures above, within the cosine of 14°.
    const gas = (90e5 - ambientPressure) * (Math.PI / 4) * 0.01;
    expect(loads[14]!.x).toBeGreaterThan(gas - 19_808.3 / 4);
    expect(loads[14]!.x).toBeLessThan(gas - (0.85 * 19_808.3) / 4);
    expect(loads[360]!.x).toBeCloseTo(-19_808.3 / 4, 0);
  });
});

interface Force {
  x: number;
  y: number;
}

function sum(forces: Force[], axis: "x" | "y"): number {
  return forces.reduce((total, force) => total + force[axis], 0);
}

/** Size of a harmonic of the crank's turn in a force over two turns. */
function harmonic(force: Force[], axis: "x" | "y", order: number): number {
  let cosine = 0;
  let sine = 0;
  force.forEach((each, index) => {
    cosine += each[axis] * Math.cos(order * index * degrees);
    sine += each[axis] * Math.sin(order * index * degrees);
  });
  return Math.hypot(cosine, sine) / 360;
}
