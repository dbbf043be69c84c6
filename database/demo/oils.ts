import type { NewOil } from "~/models/oil.server";

/** The demo's oils, thick to thin; invented, with figures as SAE J300 has them for their grades. */
export const demoOils = [
  {
    name: "Ostrel 20W-50",
    grade: "20W-50",
    kv40: 164,
    kv100: 18.4,
    density15: 884,
    hthsPaS: 0.0049,
    note: "Usual oil of the shop; changed after every event.",
  },
  {
    name: "Ostrel 10W-40",
    grade: "10W-40",
    kv40: 98.5,
    kv100: 14.6,
    density15: 868,
    hthsPaS: 0.0041,
    note: "One grade thinner, for fits that have settled.",
  },
  {
    name: "Vindle 5W-30",
    grade: "5W-30",
    kv40: 64.2,
    kv100: 11.1,
    density15: 857,
    hthsPaS: 0.0033,
    note: "",
  },
  {
    name: "Vindle 0W-20",
    grade: "0W-20",
    kv40: 43.6,
    kv100: 8.4,
    density15: 846,
    hthsPaS: 0.0027,
    note: "For qualifying only; nothing here has been built for it yet.",
  },
] as const satisfies NewOil[];

export type DemoOilName = (typeof demoOils)[number]["name"];

/** An oil of the demo by its name. */
export function demoOil(name: DemoOilName) {
  return demoOils.find((oil) => oil.name === name)!;
}
