import { type DatabaseTransaction, database } from "#database/connection";
import { instant, newId } from "#database/id";
import type { Environment } from "#database/schema";
import { EngineeringError } from "~/engineering/engineering-error";
import { parseQuantity, type Quantity } from "~/engineering/quantity/parse";
import type { FitKindName } from "~/engineering/trade/fit-kinds";
import { fitsOfLayout, type Layout, layoutLimitsSource } from "~/engineering/trade/layout";
import { recordHistory } from "./history.server";
import { lengthColumns, optionalLengthColumns } from "./length-columns";
import { conflict, invalid, notFound } from "./refusal";
import type { Scope } from "./scope";
import { isVisible } from "./visible-engines.server";

/** A fit to set up, each length as it was typed. */
export interface NewFit {
  kind: FitKindName;
  nominal: Quantity;
  length?: Quantity | undefined;
  usual: Quantity;
  least: Quantity;
  most: Quantity;
  limitsSource?: string | undefined;
  tolerance?: Quantity | undefined;
  boreMaterial?: string | undefined;
  journalMaterial?: string | undefined;
  boreFinish?: Quantity | undefined;
  journalFinish?: Quantity | undefined;
  coating?: string | undefined;
}

export interface NewEngine extends Layout {
  name: string;
  bore: Quantity;
  stroke: Quantity;
  rodLength: Quantity;
  revLimitRpm: number;
  duty: string;
  environment: Environment;
  /** Fits not given take the layout's usual set. */
  fits?: NewFit[] | undefined;
}

/** The engines this person may see, with their latest build. */
export function listEngines(scope: Scope, page: { after?: string | undefined; most: number }) {
  return database()
    .selectFrom("engine")
    .leftJoin("build", (join) =>
      join.onRef("build.engine_id", "=", "engine.id").on((latest) =>
        latest(
          "build.number",
          "=",
          latest
            .selectFrom("build as other")
            .select((b) => b.fn.max("other.number").as("n"))
            .whereRef("other.engine_id", "=", "engine.id"),
        ),
      ),
    )
    .select([
      "engine.id",
      "engine.name",
      "engine.form",
      "engine.cylinders",
      "engine.environment",
      "engine.duty",
      "engine.version",
      "build.id as buildId",
      "build.number as buildNumber",
      "build.state as buildState",
    ])
    .where(isVisible(scope))
    .$if(page.after !== undefined, (query) => query.where("engine.id", ">", page.after as string))
    .orderBy("engine.id")
    .limit(page.most)
    .execute();
}

/** One engine this person may see. @throws Refusal `not-found` */
export async function findEngine(scope: Scope, id: string) {
  const engine = await database()
    .selectFrom("engine")
    .selectAll()
    .where("engine.id", "=", id)
    .where(isVisible(scope))
    .executeTakeFirst();
  if (!engine) throw notFound("engine");
  return engine;
}

export type Engine = Awaited<ReturnType<typeof findEngine>>;

/** Sets an engine up: itself, its fits and their positions, all or nothing. */
export async function insertEngine(scope: Scope, engine: NewEngine): Promise<string> {
  const layoutFits = usualFits(engine);
  const id = newId();
  await database()
    .transaction()
    .execute(async (transaction) => {
      await refuseTakenName(transaction, scope, engine.name);
      await transaction
        .insertInto("engine")
        .values({
          id,
          shop_id: scope.shopId,
          name: engine.name,
          form: engine.form,
          cylinders: engine.cylinders,
          mains: engine.mains,
          valves_per_cylinder: engine.valvesPerCylinder,
          ...lengthColumns("bore", engine.bore),
          ...lengthColumns("stroke", engine.stroke),
          ...lengthColumns("rod_length", engine.rodLength),
          rev_limit_rpm: engine.revLimitRpm,
          duty: engine.duty,
          environment: engine.environment,
          created_at: instant(),
          version: 1,
        })
        .execute();
      await insertFits(transaction, scope, id, engine, layoutFits);
      await recordHistory(transaction, scope, {
        engineId: id,
        subjectKind: "engine",
        subjectId: id,
        what: `set up ${engine.name}`,
      });
    });
  return id;
}

function usualFits(layout: Layout) {
  try {
    return fitsOfLayout(layout);
  } catch (error) {
    if (error instanceof EngineeringError)
      throw invalid({ path: error.field, code: error.code, message: error.message });
    throw error;
  }
}

async function refuseTakenName(transaction: DatabaseTransaction, scope: Scope, name: string): Promise<void> {
  const taken = await transaction
    .selectFrom("engine")
    .select("id")
    .where("shop_id", "=", scope.shopId)
    .where("name", "=", name)
    .executeTakeFirst();
  if (taken) throw conflict("name-taken", `The shop already has an engine called ${name}.`);
}

async function insertFits(
  transaction: DatabaseTransaction,
  scope: Scope,
  engineId: string,
  engine: NewEngine,
  layoutFits: ReturnType<typeof fitsOfLayout>,
): Promise<void> {
  const given = engine.fits ?? layoutFits.map(startingFit);
  const kinds = new Set<string>();
  for (const [index, fit] of given.entries()) {
    if (kinds.has(fit.kind)) {
      throw invalid({
        path: `fits[${index}].kind`,
        code: "twice",
        message: `The engine has ${fit.kind} twice.`,
      });
    }
    kinds.add(fit.kind);
    const fitId = newId();
    await transaction
      .insertInto("fit")
      .values({
        id: fitId,
        shop_id: scope.shopId,
        engine_id: engineId,
        kind: fit.kind,
        sort_order: index,
        ...fitColumns(fit, `fits[${index}]`),
        method: "absolute",
        created_at: instant(),
        version: 1,
      })
      .execute();
    const positions = layoutFits.find((other) => other.kind === fit.kind)?.positions ?? engine.cylinders;
    await transaction
      .insertInto("position")
      .values(
        Array.from({ length: positions }, (_, place) => ({
          id: newId(),
          shop_id: scope.shopId,
          fit_id: fitId,
          number: place + 1,
          retired_at: null,
        })),
      )
      .execute();
  }
}

function startingFit(fit: ReturnType<typeof fitsOfLayout>[number]): NewFit {
  return {
    kind: fit.kind,
    nominal: parseQuantity(fit.nominal, "length"),
    usual: parseQuantity(fit.usual, "small-length"),
    least: parseQuantity(fit.least, "small-length"),
    most: parseQuantity(fit.most, "small-length"),
  };
}

// A window of three tenths either side of the aim is what a careful shop holds by trimming shells (common practice).
const usualTolerance = () => parseQuantity("0.0003 in", "small-length");

/** A fit's columns from what was typed, refused where its limits do not enclose its usual clearance. */
export function fitColumns(fit: NewFit, path: string) {
  const at = (field: string, message: string) =>
    invalid({ path: path ? `${path}.${field}` : field, code: "out-of-order", message });
  const [least, usual, most] = [fit.least, fit.usual, fit.most].map(
    (quantity) => quantity.picometres as number,
  );
  if (least! > usual!) throw at("hardLimits.least", "The least clearance is over the usual clearance.");
  if (usual! > most!) throw at("hardLimits.most", "The most clearance is under the usual clearance.");
  if (fit.nominal.si <= 0) throw at("nominal", "The nominal size must be over zero.");
  return {
    ...lengthColumns("nominal", fit.nominal),
    ...optionalLengthColumns("length", fit.length),
    ...lengthColumns("usual", fit.usual),
    ...lengthColumns("least", fit.least),
    ...lengthColumns("most", fit.most),
    ...lengthColumns("tolerance", fit.tolerance ?? usualTolerance()),
    ...optionalLengthColumns("bore_finish", fit.boreFinish),
    ...optionalLengthColumns("journal_finish", fit.journalFinish),
    limits_source: fit.limitsSource || layoutLimitsSource,
    bore_material: fit.boreMaterial || "steel-4340",
    journal_material: fit.journalMaterial || "steel-4340",
    coating: fit.coating || null,
    coated_since_build: fit.coating ? 1 : null,
  };
}

async function insertAssignment(
  transaction: DatabaseTransaction,
  scope: Scope,
  engineId: string,
  personId: string,
): Promise<void> {
  await transaction
    .insertInto("engine_assignment")
    .values({
      id: newId(),
      shop_id: scope.shopId,
      engine_id: engineId,
      person_id: personId,
      created_at: instant(),
    })
    .onConflict((conflict) => conflict.doNothing())
    .execute();
}

/** Gives a crew chief or a customer an engine to see. @throws Refusal `not-found` */
export async function assignEngine(scope: Scope, engineId: string, personId: string): Promise<void> {
  const engine = await findEngine(scope, engineId);
  const member = await database()
    .selectFrom("membership")
    .innerJoin("person", "person.id", "membership.person_id")
    .select("person.name")
    .where("membership.shop_id", "=", scope.shopId)
    .where("membership.person_id", "=", personId)
    .executeTakeFirst();
  if (!member) throw notFound("person");
  await database()
    .transaction()
    .execute(async (transaction) => {
      await insertAssignment(transaction, scope, engineId, personId);
      await recordHistory(transaction, scope, {
        engineId,
        subjectKind: "engine",
        subjectId: engineId,
        what: `assigned ${engine.name} to ${member.name}`,
      });
    });
}

/** Takes an engine from a crew chief or a customer again. */
export async function unassignEngine(scope: Scope, engineId: string, personId: string): Promise<void> {
  const engine = await findEngine(scope, engineId);
  await database()
    .transaction()
    .execute(async (transaction) => {
      const result = await transaction
        .deleteFrom("engine_assignment")
        .where("engine_id", "=", engineId)
        .where("person_id", "=", personId)
        .executeTakeFirst();
      if (result.numDeletedRows === 0n) return;
      await recordHistory(transaction, scope, {
        engineId,
        subjectKind: "engine",
        subjectId: engineId,
        what: `took ${engine.name} from a person`,
        from: { personId },
      });
    });
}

/** Who is assigned to an engine. */
export function listAssignments(scope: Scope, engineId: string) {
  return database()
    .selectFrom("engine_assignment")
    .innerJoin("person", "person.id", "engine_assignment.person_id")
    .select(["person.id", "person.name"])
    .where("engine_assignment.engine_id", "=", engineId)
    .where("engine_assignment.shop_id", "=", scope.shopId)
    .orderBy("person.name")
    .execute();
}
