import type { History, Iteration, PositionOfBuild } from "~/engineering/next-step/types";
import type { HistoryIn } from "./history-shape";

type IterationIn = HistoryIn["iterations"][number];

/** A history as the core takes it. */
export function historyOf({ fit, iterations }: Pick<HistoryIn, "fit" | "iterations">): History {
  return { fit: definedOnly(fit), iterations: iterations.map(iterationOf) };
}

function iterationOf({ oil, hours, positions, ...rest }: IterationIn): Iteration {
  return definedOnly({
    ...rest,
    hours: hours ?? null,
    oil: oil ? oilOf(oil) : null,
    positions: positions.map(positionOf),
  });
}

function oilOf({ temperature, ...rest }: NonNullable<IterationIn["oil"]>) {
  return { ...rest, temperatureC: temperature ?? null };
}

function positionOf(position: IterationIn["positions"][number]): PositionOfBuild {
  const { assembled, tornDown, grade, damage, ...rest } = position;
  return {
    ...rest,
    assembled: assembled ?? null,
    tornDown: tornDown ?? null,
    grade: grade ?? null,
    damage: damage ?? null,
  };
}

// The core tells a field that is not there from one that is `null`: what nobody said must not be there.
function definedOnly<T extends object>(fields: T): T {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as T;
}
