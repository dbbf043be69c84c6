import type {
  History,
  Iteration,
  MeasuredFit,
  OilOfRun,
  PositionOfBuild,
  Rules,
} from "~/engineering/next-step/types";
import type { QuantityOut, Say } from "../frame/quantity-out";
import type { HistoryOut } from "./history-shape";

type IterationOut = HistoryOut["iterations"][number];

/** A fit's history and its shop's rules as `/calc/next-step` takes them. */
export function sayHistory({ fit, iterations }: History, rules: Rules, say: Say): HistoryOut {
  const { kind, nominal, positions, hardLimits, coating, finishes } = fit;
  return {
    fit: {
      kind: kind as HistoryOut["fit"]["kind"],
      nominal: say.length(nominal),
      positions,
      hardLimits: hardLimits && {
        least: say.clearance(hardLimits.least),
        most: say.clearance(hardLimits.most),
      },
      coating,
      finishes: { bore: optional(finishes?.bore, say.fine), journal: optional(finishes?.journal, say.fine) },
    },
    rules: {
      ...rules,
      usual: optional(rules.usual, say.clearance),
      largestStep: optional(rules.largestStep, say.clearance),
    },
    iterations: iterations.map((iteration) => sayIteration(iteration, say)),
  };
}

function sayIteration({ target, oil, events, positions, ...rest }: Iteration, say: Say): IterationOut {
  return {
    ...rest,
    target: say.clearance(target),
    oil: oil && sayOil(oil, say),
    events: events as IterationOut["events"],
    positions: positions.map((position) => sayPosition(position, say)),
  };
}

function sayOil({ name, grade, kv40, kv100, temperatureC, dynamicViscosity }: OilOfRun, say: Say) {
  return {
    name,
    grade,
    kv40: optional(kv40, say.kinematic),
    kv100: optional(kv100, say.kinematic),
    temperature: optional(temperatureC, say.temperature),
    dynamicViscosity: optional(dynamicViscosity, say.viscosity),
  };
}

function sayPosition(position: PositionOfBuild, say: Say): IterationOut["positions"][number] {
  const { assembled, tornDown, uncertainty, damage, coatingState, ...rest } = position;
  return {
    ...rest,
    assembled: assembled && sayMeasured(assembled, say),
    tornDown: tornDown && sayMeasured(tornDown, say),
    uncertainty: optional(uncertainty, say.fine),
    damage: damage as IterationOut["positions"][number]["damage"],
    coatingState: coatingState as IterationOut["positions"][number]["coatingState"],
  };
}

function sayMeasured({ clearance, bore, journal }: MeasuredFit, say: Say) {
  return {
    clearance: say.clearance(clearance),
    bore: optional(bore, say.length),
    journal: optional(journal, say.length),
  };
}

/** What is not there, or null, stays so. */
function optional<None extends null | undefined>(
  value: number | None,
  as: (si: number) => QuantityOut,
): QuantityOut | None {
  return typeof value === "number" ? as(value) : value;
}
