import type { Fit } from "~/models/fit.server";
import { invalid } from "~/models/refusal";

/** The fit and position that a body names. @throws Refusal `invalid` where the engine has them not */
export function positionOfEngine(fits: readonly Fit[], named: { fit: string; position: number }) {
  const fit = fits.find(({ id }) => id === named.fit);
  if (!fit) {
    throw invalid({
      path: "fit",
      code: "unknown-fit",
      message: "The engine has no such fit; GET /engines/{engine} lists them.",
    });
  }
  const position = fit.positions.find(({ number }) => number === named.position);
  if (position) return { fit, position };
  throw invalid({
    path: "position",
    code: "unknown-position",
    message: `This fit has no position ${named.position}, only ${fit.positions.map(({ number }) => number).join(", ")}.`,
  });
}
