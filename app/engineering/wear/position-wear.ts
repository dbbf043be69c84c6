import { EngineeringError } from "../engineering-error";

/** Bore and journal of a position, each diameter at 20 °C, m. */
export interface Diameters {
  bore: number;
  journal: number;
}

export interface FeatureWear {
  /** Metal lost, on the diameter, m; negative where the part seems to have grown. */
  wear: number;
  /** Expanded (about 95 %) uncertainty of that difference, m. */
  uncertainty: number;
  /** `not-measurable`: less than the gauges can see. `slip`: negative by more than they can err. */
  verdict: "worn" | "not-measurable" | "slip";
  /** Not measurable: the wear is at most this, m. Else null. */
  bound: number | null;
}

export interface PositionWear {
  bore: FeatureWear;
  journal: FeatureWear;
  /** Both together: growth of the clearance. */
  clearance: FeatureWear;
}

/**
 * The wear of one position between assembly and teardown, m.
 * @param uncertainty expanded (about 95 %) uncertainty of one diameter, m, above zero
 * @throws EngineeringError `not-positive`, `interference` where a journal is not smaller than its bore
 */
export function positionWear(assembled: Diameters, tornDown: Diameters, uncertainty: number): PositionWear {
  checkDiameters(assembled, "assembled");
  checkDiameters(tornDown, "tornDown");
  const bore = tornDown.bore - assembled.bore;
  const journal = assembled.journal - tornDown.journal;
  // A wear is a difference of two diameters, the growth of a clearance one of four; independent errors add in squares.
  return {
    bore: judgeWear(bore, Math.SQRT2 * uncertainty),
    journal: judgeWear(journal, Math.SQRT2 * uncertainty),
    clearance: judgeWear(bore + journal, 2 * uncertainty),
  };
}

/**
 * A wear against its own uncertainty: worn, not measurable (with the most it can be), or a measuring slip.
 * @param uncertainty expanded (about 95 %) uncertainty of the wear, same unit, above zero
 */
export function judgeWear(wear: number, uncertainty: number): FeatureWear {
  if (!(uncertainty > 0) || !Number.isFinite(uncertainty)) {
    throw new EngineeringError("not-positive", "uncertainty", "The uncertainty of a reading is above zero.");
  }
  if (!Number.isFinite(wear)) throw new EngineeringError("not-a-number", "wear", "The wear is not a number.");
  if (wear > uncertainty) return { wear, uncertainty, verdict: "worn", bound: null };
  if (wear < -uncertainty) return { wear, uncertainty, verdict: "slip", bound: null };
  return { wear, uncertainty, verdict: "not-measurable", bound: Math.max(wear, 0) + uncertainty };
}

function checkDiameters({ bore, journal }: Diameters, field: string): void {
  for (const [name, value] of Object.entries({ bore, journal })) {
    if (!(value > 0) || !Number.isFinite(value)) {
      throw new EngineeringError("not-positive", `${field}.${name}`, `The ${name} diameter is above zero.`);
    }
  }
  if (journal >= bore) {
    throw new EngineeringError(
      "interference",
      `${field}.journal`,
      "The journal is not smaller than its bore; check whether they were swapped.",
    );
  }
}
