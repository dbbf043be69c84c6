import { listOils } from "~/models/oil.server";
import { invalid } from "~/models/refusal";
import type { Scope } from "~/models/scope";

/** The id of the shop's oil that a body names by its id or its name. @throws Refusal `invalid` where there is none */
export async function oilOfShop(scope: Scope, idOrName: string): Promise<string> {
  const oils = await listOils(scope);
  const oil = oils.find(({ id }) => id === idOrName) ?? oils.find((candidate) => candidate.name === idOrName);
  if (oil) return oil.id;
  throw invalid({
    path: "oil",
    code: "unknown-oil",
    message:
      "The shop has no such oil. Give the id or the name of one of GET /oils, or add it with POST /oils.",
  });
}
