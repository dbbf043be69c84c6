import { believe, type Sign } from "../../../app/engineering/next-step/posterior";
import { lookAhead } from "../../../app/engineering/next-step/look-ahead";
import type { Policy } from "./season";
export const opts = { maxFail: 0.01, maxDist: 0.15, weight: 0.8, trace: false };
const um = 1e6;
export const proto: Policy = (shop, its) => {
  const last = its.at(-1);
  const usual = shop.usual * um;
  if (!last) return { target: shop.usual, done: false };
  const foreign = (it: any) => it.positions.some((p: any) => ["embedded-particles", "scoring"].includes(p.damage));
  if (foreign(last) ) return { target: last.target, done: false };
  const signs: Sign[] = [];
  const u = last.positions[0]!.uncertainty! / 2 * um;
  for (const it of its) {
    if (foreign(it)) continue;
    for (const p of it.positions) {
      const t = it.target * um;
      const a = p.assembled!.clearance * um, d = p.tornDown!.clearance * um;
      const okA = Math.abs(a - t) < 10, okD = Math.abs(d - a) < 12;
      const k = 1.44 / (1.44 + u * u);
      const c = okA ? t + k * (a - t) : t;
      signs.push({ clearance: c, grade: p.grade, wear: okA && okD && !(it.build === 1 && shop.fit.coating) ? d - a : null, wearUncertainty: u * Math.SQRT2, hours: it.hours!, weight: opts.weight });
    }
  }
  const sc = Math.sqrt(1.44 * u * u / (1.44 + u * u));
  const belief = believe(signs, usual, Math.hypot(sc, 0.4));
  const t0 = last.target * um;
  const sit = { current: t0, positions: last.positions.length, scatter: 1.2, wearUncertainty: u * Math.SQRT2, hours: 6, largestStep: 5.08, hardLeast: 25.4, hardMost: 81.28 };
  const minStep = Math.max(2 * u, 1.27);
  const cands: number[] = [];
  for (let k = -8; k <= 12; k++) { const d = k * 1.27; if (k === 0 || (Math.abs(d) >= minStep - 1e-9 && d >= -5.08 - 1e-9)) { const t = t0 + d; if (t > 25.4 && t < 81.28) cands.push(t); } }
  const { settled, prospects } = lookAhead(belief, sit, cands);
  let best = { target: t0, cost: settled, done: true };
  for (const p of prospects) {
    if (p.target < t0 && (p.failure > opts.maxFail || p.distress > opts.maxDist)) continue;
    if (p.expectedCost < best.cost) best = { target: p.target, cost: p.expectedCost, done: false };
  }
  if (opts.trace) console.log(its.length, (shop.best*um).toFixed(1), t0.toFixed(1), last.positions.map(p => p.grade).join(""), "settle", settled.toFixed(2), prospects.map(p => `${(p.target-t0).toFixed(1)}:${p.expectedCost.toFixed(2)}/${(100*p.distress).toFixed(0)}/${(100*p.failure).toFixed(1)}`).join(" "), "->", best.target.toFixed(1), best.done);
  return { target: best.target / um, done: best.done };
};
