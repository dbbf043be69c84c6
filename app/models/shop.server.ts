import type { Updateable } from "kysely";
import { database } from "#database/connection";
import type { ShopTable } from "#database/schema";
import { recordHistory } from "./history.server";
import { conflict } from "./refusal";
import type { Scope } from "./scope";

const ruleColumns = [
  "largest_step_pm",
  "least_hours",
  "stop_grade",
  "baseline_runs",
  "wear_rate_rise",
] as const;

/** The shop's rules for the next step. */
export type ShopRules = Required<Pick<Updateable<ShopTable>, (typeof ruleColumns)[number]>>;

/** What a new shop starts with (common practice): two tenths at a time, two hours before judging, one clean baseline. */
export const usualRules: ShopRules = {
  largest_step_pm: 5_080_000,
  least_hours: 2,
  stop_grade: 3,
  baseline_runs: 1,
  wear_rate_rise: 1.5,
};

/** The rules as they stand, with the version to change them by. */
export function findShopRules(scope: Scope) {
  return database()
    .selectFrom("shop")
    .select([...ruleColumns, "version"])
    .where("id", "=", scope.shopId)
    .executeTakeFirstOrThrow();
}

/** Changes the rules. @throws Refusal `conflict` where someone else changed them meanwhile */
export async function updateShopRules(scope: Scope, rules: ShopRules, version: number): Promise<void> {
  const before = await findShopRules(scope);
  await database()
    .transaction()
    .execute(async (transaction) => {
      const result = await transaction
        .updateTable("shop")
        .set({ ...rules, version: version + 1 })
        .where("id", "=", scope.shopId)
        .where("version", "=", version)
        .executeTakeFirst();
      if (result.numUpdatedRows === 0n) {
        throw conflict(
          "lost-update",
          "Someone changed the rules while you were typing. Look at them again, then save.",
        );
      }
      await recordHistory(transaction, scope, {
        subjectKind: "shop",
        subjectId: scope.shopId,
        what: "changed the rules of the next step",
        from: before,
        to: rules,
      });
    });
}
