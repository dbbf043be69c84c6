import { EngineeringError } from "../engineering-error";
import type { BigEndLoad } from "./big-end-load";
import { degrees, engineCycleAngle } from "./crank-angle";
import { type CrankLayout, type CrankThrow, firingAngles } from "./crank-layout";
import type { LoadPoint } from "./load-cycle";

/** What turns with each throw besides the rods. */
export interface CrankBalance {
  /**
   * Of pin, webs and counterweights together: mass times the distance of its centre from the crank's axis, kg·m, above
   * zero on the pin's side. 0 is a throw that balances itself.
   */
  throwMassMoment: number;
}

/**
 * Loads of the mains over one cycle in the block's frame, front main first: every throw is carried by the mains next
 * to it, half by each where it stands alone between them, by the lever where two share a bay.
 * @param bigEnd load of a big end by its own cylinder's crank angle, 0 at firing
 * Expected error: a real crank is stiff over several mains and bends the block; half-share is 10–30 % off in single
 * mains and right in the sum (common practice, no source). Source: C. F. Taylor, vol. 2, ch. 8 (from memory).
 * @throws EngineeringError `mains` where the throws do not spread evenly over the bays, and as `firingAngles`
 */
export function mainLoads(
  layout: CrankLayout,
  bigEnd: (crankAngle: number) => BigEndLoad,
  speed: number,
  { throwMassMoment }: CrankBalance = { throwMassMoment: 0 },
): LoadPoint[][] {
  const fires = firingAngles(layout);
  const shares = throwShares(layout);
  const count = Math.round(engineCycleAngle / degrees);
  const loads = Array.from({ length: layout.mains }, () =>
    Array.from({ length: count }, (_, index) => ({ crankAngle: index * degrees, x: 0, y: 0 })),
  );
  layout.throws.forEach((each, place) => {
    for (let index = 0; index < count; index++) {
      const crankAngle = index * degrees;
      const pushed = forceOnThrow(each, layout.axes, fires, crankAngle, bigEnd);
      const pulled = throwMassMoment * speed ** 2;
      const x = pushed.x + pulled * Math.cos(each.angle + crankAngle);
      const y = pushed.y + pulled * Math.sin(each.angle + crankAngle);
      for (const { main, share } of shares[place]!) {
        loads[main]![index]!.x += share * x;
        loads[main]![index]!.y += share * y;
      }
    }
  });
  return loads;
}

/** Force of the rods on a throw in the block's frame, N. */
function forceOnThrow(
  { cylinders }: CrankThrow,
  axes: readonly number[],
  fires: readonly number[],
  crankAngle: number,
  bigEnd: (crankAngle: number) => BigEndLoad,
) {
  let x = 0;
  let y = 0;
  for (const number of cylinders) {
    const load = bigEnd(crankAngle - fires[number - 1]!);
    const rod = axes[number - 1]! + load.frameAngle;
    x -= load.x * Math.cos(rod) - load.y * Math.sin(rod);
    y -= load.x * Math.sin(rod) + load.y * Math.cos(rod);
  }
  return { x, y };
}

/** Which mains carry each throw, and with what share. */
function throwShares({ throws, mains }: CrankLayout): { main: number; share: number }[][] {
  const perBay = throws.length / (mains - 1);
  if (!Number.isInteger(mains) || mains < 2 || !Number.isInteger(perBay)) {
    throw new EngineeringError(
      "mains",
      "layout.mains",
      `${throws.length} throws do not spread evenly between ${mains} mains.`,
    );
  }
  return throws.map((_, place) => {
    const bay = Math.floor(place / perBay);
    const along = ((place % perBay) + 1) / (perBay + 1);
    return [
      { main: bay, share: 1 - along },
      { main: bay + 1, share: along },
    ];
  });
}
