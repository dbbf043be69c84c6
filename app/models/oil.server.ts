import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import { recordHistory } from "./history.server";
import { conflict, invalid, notFound } from "./refusal";
import type { Scope } from "./scope";

/** An oil of the shop: kinematic viscosities in mm²/s, density in kg/m³, HTHS in Pa·s. */
export interface NewOil {
  name: string;
  grade: string;
  kv40: number;
  kv100: number;
  density15?: number | undefined;
  hthsPaS?: number | undefined;
  note: string;
}

/** The shop's oils by name. */
export function listOils(scope: Scope) {
  return database()
    .selectFrom("oil")
    .selectAll()
    .where("shop_id", "=", scope.shopId)
    .orderBy("name")
    .execute();
}

export type Oil = Awaited<ReturnType<typeof listOils>>[number];

/** One oil of the shop. @throws Refusal `not-found` */
export async function findOil(scope: Scope, id: string): Promise<Oil> {
  const oil = await database()
    .selectFrom("oil")
    .selectAll()
    .where("id", "=", id)
    .where("shop_id", "=", scope.shopId)
    .executeTakeFirst();
  if (!oil) throw notFound("oil");
  return oil;
}

/** Adds an oil. @throws Refusal where its viscosities make no oil, or the name is taken */
export async function insertOil(scope: Scope, oil: NewOil): Promise<string> {
  if (oil.kv100 >= oil.kv40) {
    throw invalid({
      path: "kv100",
      code: "viscosity-order",
      message: "An oil is thinner at 100 °C than at 40 °C: KV100 must be under KV40. Are they exchanged?",
    });
  }
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      const taken = await transaction
        .selectFrom("oil")
        .select("id")
        .where("shop_id", "=", scope.shopId)
        .where("name", "=", oil.name)
        .executeTakeFirst();
      if (taken) throw conflict("name-taken", `The shop already has an oil called ${oil.name}.`);
      await transaction
        .insertInto("oil")
        .values({
          id,
          shop_id: scope.shopId,
          name: oil.name,
          grade: oil.grade,
          kv40: oil.kv40,
          kv100: oil.kv100,
          density15: oil.density15 ?? null,
          hths_pa_s: oil.hthsPaS ?? null,
          note: oil.note,
          created_at: instant(),
          version: 1,
        })
        .execute();
      await recordHistory(transaction, scope, {
        subjectKind: "oil",
        subjectId: id,
        what: `added the oil ${oil.name}`,
      });
    });
  return id;
}
