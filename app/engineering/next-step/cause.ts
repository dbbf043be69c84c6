import type { WeighedBuild } from "./likeness";
import type { Verdict } from "./verdict";

/**
 * The second guard: damage that clearance does not explain has to be understood before the clearance is judged. The
 * build then counts for nothing, and the next one repeats its target.
 */
export function judgeCause({ iteration, elsewhere }: WeighedBuild): Verdict | null {
  const first = elsewhere[0];
  if (!first) return null;
  return {
    action: "find-cause",
    target: iteration.target,
    reason: {
      code: "damage-elsewhere",
      values: { build: iteration.build, position: first.position, damage: first.damage, look: first.look },
    },
  };
}
