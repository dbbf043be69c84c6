import { ClearanceByBuild } from "~/components/drawings/clearance-by-build";
import { WearAgainstClearance } from "~/components/drawings/wear-against-clearance";
import type { BuildColumns } from "~/engineering/next-step/build-columns";
import type { BuildEvidence } from "~/engineering/next-step/types";
import type { PageUnits } from "~/engineering/quantity/figures";

interface FitChartsProps {
  title: string;
  units: PageUnits;
  builds: BuildColumns;
  /** What the latest proposal made of each build, and where it thinks the limit lies. */
  evidence: BuildEvidence[];
  likelyLimit: { from: number; to: number; share: number } | undefined;
}

/** A fit's history as drawings. */
export function FitCharts({ title, units, builds, evidence, likelyLimit }: FitChartsProps) {
  return (
    <div className="mb-6 grid gap-6">
      <ClearanceByBuild title={`${title}, clearance by build`} units={units} builds={builds} />
      <WearAgainstClearance
        title={`${title}, wear against clearance`}
        units={units}
        likelyLimit={likelyLimit}
        points={evidence.flatMap(({ build, clearance, wearRate, wearRateUncertainty, worstGrade }) =>
          clearance === null || wearRate === null || wearRateUncertainty === null
            ? []
            : [
                {
                  build,
                  clearance,
                  rate: wearRate,
                  uncertainty: 2 * wearRateUncertainty,
                  grade: worstGrade ?? undefined,
                },
              ],
        )}
      />
    </div>
  );
}
