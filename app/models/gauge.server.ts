import { database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Quantity } from "~/engineering/quantity/parse";
import { recordHistory } from "./history.server";
import { lengthColumns } from "./length-columns";
import { conflict, notFound } from "./refusal";
import type { Scope } from "./scope";

/** A measuring instrument: the step it resolves, and the standard uncertainties of its calibration and its repeats. */
export interface NewGauge {
  name: string;
  kind: string;
  serial: string;
  resolution: Quantity;
  calibration: Quantity;
  repeatability: Quantity;
  dueOn?: string | undefined;
}

/** The shop's gauges by name. */
export function listGauges(scope: Scope) {
  return database()
    .selectFrom("gauge")
    .selectAll()
    .where("shop_id", "=", scope.shopId)
    .orderBy("name")
    .execute();
}

export type Gauge = Awaited<ReturnType<typeof listGauges>>[number];

/** One gauge of the shop. @throws Refusal `not-found` */
export async function findGauge(scope: Scope, id: string): Promise<Gauge> {
  const gauge = (await listGauges(scope)).find((candidate) => candidate.id === id);
  if (!gauge) throw notFound("gauge");
  return gauge;
}

/** Adds a gauge. @throws Refusal where the name is taken */
export async function insertGauge(scope: Scope, gauge: NewGauge): Promise<string> {
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      const taken = await transaction
        .selectFrom("gauge")
        .select("id")
        .where("shop_id", "=", scope.shopId)
        .where("name", "=", gauge.name)
        .executeTakeFirst();
      if (taken) throw conflict("name-taken", `The shop already has a gauge called ${gauge.name}.`);
      await transaction
        .insertInto("gauge")
        .values({
          id,
          shop_id: scope.shopId,
          name: gauge.name,
          kind: gauge.kind,
          serial: gauge.serial,
          ...lengthColumns("resolution", gauge.resolution),
          ...lengthColumns("calibration", gauge.calibration),
          ...lengthColumns("repeatability", gauge.repeatability),
          due_on: gauge.dueOn ?? null,
          created_at: instant(),
          version: 1,
        })
        .execute();
      await recordHistory(transaction, scope, {
        subjectKind: "gauge",
        subjectId: id,
        what: `added the gauge ${gauge.name}`,
      });
    });
  return id;
}
