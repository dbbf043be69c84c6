import { place } from "./scale";

/** Where the axes of a section lie, ° from the parting line; a journal turns, so its A and B only stand square. */
export const axisAngles = { vertical: 90, plus45: 45, minus45: 135, horizontal: 0, a: 90, b: 0 } as const;

/**
 * A diameter all the way round from those measured: through each of them, eased in between. A diameter is the same
 * every half turn. The mapping is angle in ° (0 to under 180) to diameter; at least one is needed.
 */
export function diameterAround(measured: ReadonlyMap<number, number>): (degrees: number) => number {
  const known = [...measured].sort(([one], [other]) => one - other);
  const [firstAngle, firstDiameter] = known[0]!;
  const closed = [...known, [firstAngle + 180, firstDiameter] as const];
  return (degrees) => {
    const half = firstAngle + ((((degrees - firstAngle) % 180) + 180) % 180);
    const next = closed.findIndex(([angle], index) => index > 0 && angle >= half);
    const [startAngle, start] = closed[next - 1]!;
    const [endAngle, end] = closed[next]!;
    const share = (half - startAngle) / (endAngle - startAngle);
    return start + (end - start) * ((1 - Math.cos(Math.PI * share)) / 2);
  };
}

/** A closed outline about a centre, from its radius at each angle in °; anticlockwise, 0 to the right. */
export function outline(x: number, y: number, radius: (degrees: number) => number): string {
  const points = Array.from({ length: 90 }, (_, index) => {
    const [across, up] = at(index * 4, radius(index * 4));
    return `${place(x + across)} ${place(y - up)}`;
  });
  return `M${points.join("L")}Z`;
}

/** How far across and up a place at an angle in ° and a distance lies. */
export function at(degrees: number, distance: number): [across: number, up: number] {
  const angle = (degrees * Math.PI) / 180;
  return [distance * Math.cos(angle), distance * Math.sin(angle)];
}
