// npx tsx scripts/bench/next-step/index.ts [--json] [--seeds tuning|untouched] [--shops 500]: plays the policies.
import { parseArgs } from "node:util";
import { benchNextStep, type PolicyRow, type SeedSet } from "./compare";

/** The goal: at most half the cost of the better plain policy, and grade 4 in under one shop in a hundred. */
function verdict({ policy, costShare, grade4, grade4Chosen }: PolicyRow): string {
  if (policy !== "next step") return "";
  const misses = [
    ...(costShare > 0.5 ? [`cost ${((costShare - 0.5) * 100).toFixed(1)} points over half`] : []),
    ...(grade4 >= 0.01
      ? [
          `grade 4 in ${(grade4 * 100).toFixed(1)} %, ${(grade4Chosen * 100).toFixed(1)} % not in the first build`,
        ]
      : []),
  ];
  return misses.length === 0 ? "meets the goal" : `misses: ${misses.join("; ")}`;
}

function print(rows: readonly PolicyRow[]): void {
  let family = "";
  for (const row of rows) {
    if (row.family !== family) {
      family = row.family;
      console.log(`\n${family}, ${row.shops} shops`);
      console.log("  policy               grade 4   grade 3  rebuilds  from best     cost   share");
      console.log("                       % shops    builds              tenths");
    }
    console.log(
      [
        `  ${row.policy.padEnd(20)}`,
        (row.grade4 * 100).toFixed(1).padStart(7),
        row.grade3.toFixed(2).padStart(9),
        row.rebuilds.toFixed(2).padStart(9),
        row.tenthsFromBest.toFixed(2).padStart(10),
        row.cost.toFixed(2).padStart(8),
        row.costShare.toFixed(2).padStart(7),
        ` ${verdict(row)}`,
      ].join(" "),
    );
  }
}

const { values } = parseArgs({
  allowPositionals: true,
  options: {
    json: { type: "boolean", default: false },
    seeds: { type: "string", default: "untouched" },
    shops: { type: "string", default: "500" },
  },
});
const rows = benchNextStep(values.seeds as SeedSet, Number(values.shops));
if (values.json) console.log(JSON.stringify(rows, null, 2));
else print(rows);
