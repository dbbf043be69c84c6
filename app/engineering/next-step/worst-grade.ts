import type { Iteration } from "./types";

/** The worst grade of a build's positions; `undefined` where none is graded. */
export function worstGrade(build: Iteration): number | undefined {
  const grades = build.positions.flatMap((position) => position.grade ?? []);
  return grades.length > 0 ? Math.max(...grades) : undefined;
}
