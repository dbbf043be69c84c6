import { families, widerFamily } from "./family";
import { Shop } from "./shop";
import { playSeason, type Policy } from "./season";
import { fixedSteps, halving, neverStepping, knowingTheTruth } from "./plain-policies";
export function run(policies: Record<string, Policy>, fams = [...families, widerFamily], n = 500, seed0 = 1000) {
  for (const f of fams) {
    console.log(f.name);
    for (const [name, p] of Object.entries(policies)) {
      const rs = Array.from({ length: n }, (_, i) => playSeason(new Shop(f, seed0 + i), p));
      const m = (g: (r: any) => number) => rs.reduce((s, r) => s + g(r), 0) / n;
      console.log("  " + name.padEnd(18), "cost", m(r => r.cost).toFixed(2).padStart(6), "g4%", (100 * m(r => r.grade4 > 0 ? 1 : 0)).toFixed(1), "chosen", (100 * m(r => r.grade4Chosen > 0 ? 1 : 0)).toFixed(1), "g3", m(r => r.grade3).toFixed(2), "reb", m(r => r.rebuilds).toFixed(2), "dist/tenth", m(r => r.distance / 2.54e-6).toFixed(2));
    }
  }
}
if (process.argv[1]?.endsWith("zz-proto.ts")) run({ fixedSteps, halving, neverStepping, knowingTheTruth });
