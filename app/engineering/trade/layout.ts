import { EngineeringError } from "../engineering-error";
import type { FitKindName } from "./fit-kinds";

/** An engine's layout as a shop describes it. */
export interface Layout {
  form: "inline" | "V" | "flat";
  cylinders: number;
  mains: number;
  valvesPerCylinder: number;
}

/** A fit that follows from a layout, with values to start from. */
export interface LayoutFit {
  kind: FitKindName;
  positions: number;
  nominal: string;
  usual: string;
  least: string;
  most: string;
}

/** Where the values a layout starts a fit with come from; the shop puts its maker's limits in their place. */
export const layoutLimitsSource = "Shop's starting value (common practice); put the parts maker's limit here";

// Usual clearances: about 0.001 in per inch of journal and 0.0005 more for shells, 0.0002–0.0008 in for performance
// wrist pins, 0.0015 in intake and toward 0.0025 in exhaust stems (common practice). Nominals are only a place to start.
const startingValues: Record<
  "main" | "big-end" | "pin-in-piston" | "pin-in-rod" | "intake-stem" | "exhaust-stem",
  Omit<LayoutFit, "kind" | "positions">
> = {
  main: { nominal: "2.4500 in", usual: "0.0027 in", least: "0.0014 in", most: "0.0035 in" },
  "big-end": { nominal: "2.1000 in", usual: "0.0025 in", least: "0.0012 in", most: "0.0032 in" },
  "pin-in-piston": { nominal: "0.9270 in", usual: "0.0008 in", least: "0.0002 in", most: "0.0012 in" },
  "pin-in-rod": { nominal: "0.9270 in", usual: "0.0008 in", least: "0.0003 in", most: "0.0013 in" },
  "intake-stem": { nominal: "0.2756 in", usual: "0.0015 in", least: "0.0008 in", most: "0.0030 in" },
  "exhaust-stem": { nominal: "0.2756 in", usual: "0.0025 in", least: "0.0012 in", most: "0.0040 in" },
};

/**
 * The fits and their positions that follow from a layout.
 * Half of an odd number of valves more go to the intake side, as is usual.
 * @throws EngineeringError `layout` where the numbers do not make an engine
 */
export function fitsOfLayout(layout: Layout): LayoutFit[] {
  const { form, cylinders, mains, valvesPerCylinder } = layout;
  if (form !== "inline" && cylinders % 2 !== 0) {
    throw new EngineeringError(
      "layout",
      "cylinders",
      `A ${form} engine has an even number of cylinders, not ${cylinders}.`,
    );
  }
  if (mains < 2 && cylinders > 1) {
    throw new EngineeringError(
      "layout",
      "mains",
      `A crank for ${cylinders} cylinders runs in at least 2 mains.`,
    );
  }
  if (mains > cylinders + 1) {
    throw new EngineeringError(
      "layout",
      "mains",
      `${cylinders} cylinders have at most ${cylinders + 1} mains.`,
    );
  }
  const intakes = Math.ceil(valvesPerCylinder / 2);
  const counts = {
    main: mains,
    "big-end": cylinders,
    "pin-in-piston": cylinders,
    "pin-in-rod": cylinders,
    "intake-stem": cylinders * intakes,
    "exhaust-stem": cylinders * (valvesPerCylinder - intakes),
  } as const;
  return Object.entries(counts).map(([kind, positions]) => ({
    kind: kind as keyof typeof counts,
    positions,
    ...startingValues[kind as keyof typeof counts],
  }));
}
