import { requireWithin } from "../cycle/sound-input";
import { hasEnough, type SummerGrade, summerGrades, winterGrades } from "./j300-grades";
import { requireViscosity } from "./oil-data";

/** What an oil's sheet says that SAE J300 has limits for. */
export interface GradeCheck {
  /** Kinematic viscosity at 100 °C, mm²/s. */
  kv100: number;
  /** Viscosity at 150 °C and 10⁶ /s, Pa·s. */
  hths?: number | undefined;
  /** What the can says: "10W-40", "SAE 30", "5W". */
  label?: string | undefined;
}

export interface Grade {
  /** The label's winter grade, where KV100 allows it; cold cranking and pumping are not checked here. */
  winter?: string;
  /** The summer grade whose limits KV100 and, where given, HTHS meet. */
  summer?: string;
  /** What does not agree with J300, a sentence each. */
  disagreements: string[];
}

/**
 * The viscosity grade of an oil, and what of its sheet disagrees with it. Where KV100 fits several of the overlapping
 * thin grades, the highest one that HTHS allows is meant (recalled from the standard).
 * Source: SAE J300, limits as in `j300-grades`; its latest revision was not seen.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function gradeOf({ kv100, hths, label }: GradeCheck): Grade {
  requireViscosity(kv100, "kv100");
  if (hths !== undefined) requireWithin(hths, "hths", { from: 1e-4, to: 0.1, unit: "Pa·s" });
  const claim = label === undefined ? undefined : readLabel(label);
  const disagreements: string[] = [];
  if (label !== undefined && !claim) disagreements.push(`"${label}" is not a grade of SAE J300.`);
  const winter = winterOf(kv100, claim?.winter, disagreements);
  const summer = summerOf(kv100, hths, claim, disagreements);
  if (claim?.summer && summer !== claim.summer) {
    disagreements.push(
      `The label says ${claim.summer}, but ${summer ? `these figures are those of a ${summer}` : "these figures fit no grade"}.`,
    );
  }
  return { ...(winter && { winter }), ...(summer && { summer }), disagreements };
}

interface Claim {
  winter?: string | undefined;
  summer?: string | undefined;
}

function readLabel(label: string): Claim | undefined {
  const [, winter, summer] = /^(?:SAE\s*)?(\d+W)?[\s-]*(\d+)?$/i.exec(label.trim()) ?? [];
  const known = {
    winter: winterGrades.find(({ grade }) => grade === winter?.toUpperCase())?.grade,
    summer: summerGrades.find(({ grade }) => grade === summer)?.grade,
  };
  const understood = (known.winter ?? known.summer) !== undefined;
  return understood && !!known.winter === !!winter && !!known.summer === !!summer ? known : undefined;
}

function winterOf(kv100: number, claimed: string | undefined, disagreements: string[]): string | undefined {
  const limits = winterGrades.find(({ grade }) => grade === claimed);
  if (!limits || hasEnough(kv100, limits.leastKv100)) return limits?.grade;
  disagreements.push(
    `A ${limits.grade} needs a KV100 of at least ${limits.leastKv100} mm²/s; this one has ${kv100}.`,
  );
  return undefined;
}

function summerOf(
  kv100: number,
  hths: number | undefined,
  claim: Claim | undefined,
  disagreements: string[],
): string | undefined {
  if (claim?.winter && !claim.summer) return undefined;
  const fitting = summerGrades.filter(
    ({ leastKv100, belowKv100 }) => hasEnough(kv100, leastKv100) && !hasEnough(kv100, belowKv100),
  );
  const highest = fitting.at(-1);
  if (!highest) {
    disagreements.push(outsideAllGrades(kv100));
    return undefined;
  }
  if (hths === undefined) return (fitting.find(({ grade }) => grade === claim?.summer) ?? highest).grade;
  const met = fitting.findLast((grade) => hasEnough(hths, leastHths(grade, claim)));
  if (!met) {
    disagreements.push(
      `KV100 is that of a ${highest.grade}, but its HTHS of ${milli(hths)} mPa·s is below the ${milli(leastHths(fitting[0]!, claim))} of a ${fitting[0]!.grade}.`,
    );
  } else if (!claim && !hasEnough(hths, met.leastHths(""))) {
    disagreements.push(
      `An HTHS of ${milli(hths)} mPa·s is enough for a 0W-${met.grade}, 5W-${met.grade} or 10W-${met.grade}; any other ${met.grade} needs ${milli(met.leastHths(""))}.`,
    );
  }
  return met?.grade;
}

/** Where nobody says what winter grade the oil has, the least of a 40's two limits counts. */
function leastHths(grade: SummerGrade, claim: Claim | undefined): number {
  return grade.leastHths(claim ? (claim.winter ?? "") : "0W");
}

function outsideAllGrades(kv100: number): string {
  const thinnest = summerGrades[0]!;
  const thickest = summerGrades[summerGrades.length - 1]!;
  return kv100 < thinnest.leastKv100
    ? `A KV100 of ${kv100} mm²/s is thinner than any grade: a ${thinnest.grade} begins at ${thinnest.leastKv100}.`
    : `A KV100 of ${kv100} mm²/s is thicker than any grade: a ${thickest.grade} ends below ${thickest.belowKv100}.`;
}

const milli = (pascalSeconds: number) => Number((pascalSeconds * 1e3).toPrecision(3));
