import { EngineeringError } from "../engineering-error";
import { degrees, engineCycleAngle } from "./crank-angle";
import type { CrankLayout, CrankThrow } from "./crank-layout";
import { cycleAngle } from "./round-the-cycle";

/**
 * A usual way to build an engine. Cylinders are numbered from the front, in a V or flat engine first the bank that
 * the crank turns away from, then the other.
 */
export interface UsualLayout {
  name: string;
  form: "inline" | "V" | "flat";
  cylinders: number;
  /** Degrees. */
  bankAngle: number;
  firingOrder: readonly number[];
  /** Degrees of crank at which the order fires, where it is not even. */
  uneven?: readonly number[];
}

/** Usual layouts, the commonest of a form and count first (common practice, no source; evenness follows by geometry). */
export const usualLayouts: readonly UsualLayout[] = [
  { name: "Single", form: "inline", cylinders: 1, bankAngle: 0, firingOrder: [1] },
  { name: "Inline 2, 360° crank", form: "inline", cylinders: 2, bankAngle: 0, firingOrder: [1, 2] },
  { name: "Inline 3", form: "inline", cylinders: 3, bankAngle: 0, firingOrder: [1, 3, 2] },
  { name: "Inline 4", form: "inline", cylinders: 4, bankAngle: 0, firingOrder: [1, 3, 4, 2] },
  { name: "Inline 5", form: "inline", cylinders: 5, bankAngle: 0, firingOrder: [1, 2, 4, 5, 3] },
  { name: "Inline 6", form: "inline", cylinders: 6, bankAngle: 0, firingOrder: [1, 5, 3, 6, 2, 4] },
  { name: "Inline 8", form: "inline", cylinders: 8, bankAngle: 0, firingOrder: [1, 6, 2, 5, 8, 3, 7, 4] },
  { name: "V2, 90°", form: "V", cylinders: 2, bankAngle: 90, firingOrder: [1, 2], uneven: [0, 450] },
  {
    name: "V4, 90°",
    form: "V",
    cylinders: 4,
    bankAngle: 90,
    firingOrder: [1, 2, 3, 4],
    uneven: [0, 180, 450, 630],
  },
  { name: "V6, 60°, six throws", form: "V", cylinders: 6, bankAngle: 60, firingOrder: [1, 4, 2, 5, 3, 6] },
  { name: "V6, 90°, split pins", form: "V", cylinders: 6, bankAngle: 90, firingOrder: [1, 4, 2, 5, 3, 6] },
  {
    name: "V8, 90°, cross-plane",
    form: "V",
    cylinders: 8,
    bankAngle: 90,
    firingOrder: [1, 5, 4, 8, 6, 3, 7, 2],
  },
  {
    name: "V8, 90°, flat-plane",
    form: "V",
    cylinders: 8,
    bankAngle: 90,
    firingOrder: [1, 5, 3, 7, 4, 8, 2, 6],
  },
  { name: "V10, 72°", form: "V", cylinders: 10, bankAngle: 72, firingOrder: [1, 6, 5, 10, 2, 7, 3, 8, 4, 9] },
  {
    name: "V12, 60°",
    form: "V",
    cylinders: 12,
    bankAngle: 60,
    firingOrder: [1, 12, 5, 8, 3, 10, 6, 7, 2, 11, 4, 9],
  },
  { name: "Flat 2", form: "flat", cylinders: 2, bankAngle: 180, firingOrder: [1, 2] },
  { name: "Flat 4", form: "flat", cylinders: 4, bankAngle: 180, firingOrder: [1, 4, 3, 2] },
  { name: "Flat 6", form: "flat", cylinders: 6, bankAngle: 180, firingOrder: [1, 6, 2, 4, 3, 5] },
];

/**
 * The commonest layout of a form and count of cylinders.
 * @throws EngineeringError `layout-unknown`: the throws and the firing order must then be given
 */
export function usualLayout(form: UsualLayout["form"], cylinders: number): UsualLayout {
  const found = usualLayouts.find((layout) => layout.form === form && layout.cylinders === cylinders);
  if (!found) {
    throw new EngineeringError(
      "layout-unknown",
      "layout",
      `There is no usual ${form} layout of ${cylinders} cylinders here; give its throws and firing order.`,
    );
  }
  return found;
}

/**
 * The crank that fires a usual layout as it says, with crank angle 0 at the firing of its first cylinder. Opposite
 * cylinders of a V share a throw where their angles agree.
 */
export function crankOf(layout: UsualLayout, mains: number): CrankLayout {
  const { cylinders, firingOrder, uneven } = layout;
  const perBank = layout.form === "inline" ? cylinders : cylinders / 2;
  const half = (layout.bankAngle / 2) * degrees;
  const axes = Array.from({ length: cylinders }, (_, index) => {
    if (layout.form === "inline") return 0;
    return index < perBank ? -half : half;
  });
  const throwAngle = (number: number) => {
    const place = firingOrder.indexOf(number);
    const fires = uneven ? uneven[place]! * degrees : (place * engineCycleAngle) / cylinders;
    return cycleAngle(axes[number - 1]! - fires, 2 * Math.PI);
  };
  const throws: CrankThrow[] = Array.from({ length: perBank }, (_, index) => {
    const [near, far] = [index + 1, index + 1 + perBank];
    const angle = throwAngle(near);
    if (far > cylinders) return [{ angle, cylinders: [near] }];
    const together = Math.cos(throwAngle(far) - angle) > 1 - 1e-9;
    return together
      ? [{ angle, cylinders: [near, far] }]
      : [
          { angle, cylinders: [near] },
          { angle: throwAngle(far), cylinders: [far] },
        ];
  }).flat();
  return { axes, throws, firingOrder, mains };
}
