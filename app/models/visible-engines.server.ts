import type { ExpressionBuilder } from "kysely";
import type { Schema } from "#database/schema";
import { seesOnlyAssigned } from "~/access/permissions";
import type { Scope } from "./scope";

/**
 * The condition that keeps a query to the engines this person may know of:
 * their shop's, and for crew chiefs and viewers only those they are assigned to.
 */
export function isVisible(scope: Scope) {
  return (engine: ExpressionBuilder<Schema, "engine">) => {
    const inShop = engine("engine.shop_id", "=", scope.shopId);
    if (!seesOnlyAssigned(scope.role)) return inShop;
    return engine.and([
      inShop,
      engine.exists(
        engine
          .selectFrom("engine_assignment")
          .select("engine_assignment.id")
          .whereRef("engine_assignment.engine_id", "=", "engine.id")
          .where("engine_assignment.person_id", "=", scope.personId),
      ),
    ]);
  };
}
