import { instant } from "#database/id";
import type { Role } from "#database/schema";
import { parseQuantity } from "~/engineering/quantity/parse";
import type { Gauge } from "~/models/gauge.server";
import { lengthColumns } from "~/models/length-columns";
import { usualRules } from "~/models/shop.server";
import type { DemoShop } from "./bench";
import type { Calendar } from "./calendar";
import { type DemoGauge, demoGauges } from "./gauges";
import { demoOils } from "./oils";
import type { Rows } from "./rows";

/** Long before the season: when the shop, its people and its gauges were entered. */
const longAgo = 420;

interface Newcomer {
  email: string;
  name: string;
  role: Role;
}

/** Adds a shop with its people, gauges and oils. */
export function setUpShop(
  rows: Rows,
  calendar: Calendar,
  name: string,
  people: readonly Newcomer[],
  passwordHash: string,
): DemoShop {
  const at = calendar.at(longAgo, 9);
  const created = { created_at: instant(at), version: 1 };
  const id = rows.idAt(at);
  rows.add("shop", { id, name, ...usualRules, ...created });
  const ids = new Map<Role, string>();
  for (const { role, ...person } of people) {
    const personId = rows.idAt(at);
    ids.set(role, personId);
    rows.add("person", {
      id: personId,
      ...person,
      password_hash: passwordHash,
      units: "inch",
      theme: "system",
      ...created,
    });
    rows.add("membership", { id: rows.idAt(at), shop_id: id, person_id: personId, role, ...created });
  }
  const owner = ids.get("owner")!;
  const shop: DemoShop = {
    id,
    rules: usualRules,
    personOf: (role) => ids.get(role) ?? owner,
    gauges: [],
    oilIds: new Map(),
  };
  for (const gauge of demoGauges) shop.gauges.push(addGauge(rows, calendar, shop, gauge));
  for (const { hthsPaS, ...oil } of demoOils) {
    const oilId = rows.idAt(at);
    shop.oilIds.set(oil.name, oilId);
    rows.add("oil", { id: oilId, shop_id: id, ...oil, hths_pa_s: hthsPaS, ...created });
  }
  return shop;
}

function addGauge(
  rows: Rows,
  calendar: Calendar,
  shop: DemoShop,
  gauge: DemoGauge,
): DemoShop["gauges"][number] {
  const at = calendar.at(longAgo, 10);
  const length = (text: string) => parseQuantity(text, "small-length");
  const row: Gauge = {
    id: rows.idAt(at),
    shop_id: shop.id,
    name: gauge.name,
    kind: gauge.kind,
    serial: gauge.serial,
    ...lengthColumns("resolution", length(gauge.resolution)),
    ...lengthColumns("calibration", length(gauge.calibration)),
    ...lengthColumns("repeatability", length(gauge.repeatability)),
    due_on: calendar.dayIn(gauge.dueInDays),
    created_at: instant(at),
    version: 1,
  };
  rows.add("gauge", row);
  return { ...gauge, row };
}
