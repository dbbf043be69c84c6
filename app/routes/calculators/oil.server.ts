import { gradeOf } from "~/engineering/oil/j300";
import { oilAt } from "~/engineering/oil/viscosity";
import { viscosityIndex } from "~/engineering/oil/viscosity-index";
import { AskedFields } from "./fields.server";

export const oilFields = [
  { name: "kv40", label: "At 40 °C", hint: "mm²/s" },
  { name: "kv100", label: "At 100 °C", hint: "mm²/s" },
  { name: "density15", label: "Density at 15 °C", hint: "kg/m³; 870 where blank" },
  { name: "hths", label: "HTHS at 150 °C", hint: "mPa·s, if known" },
  { name: "temperature", label: "Temperature", hint: "°C, or 221 degF; beside the usual ones" },
];

const usualTemperatures = [0, 20, 40, 60, 80, 100, 120, 150];

/** An oil's index, grade and viscosities from what its data sheet says. */
export async function calculateOil(searched: URLSearchParams) {
  const asked = new AskedFields(searched);
  const page = { typed: asked.typed, errors: asked.errors };
  if (asked.isEmpty) return { ...page, result: undefined };
  const kinematic = { kind: "kinematic-viscosity", unit: "mm2/s" } as const;
  const oil = {
    kv40: await asked.required("kv40", kinematic),
    kv100: await asked.required("kv100", kinematic),
    density15: await asked.quantity("density15", { kind: "density", unit: "kg/m3" }),
    hths: await asked.quantity("hths", { kind: "dynamic-viscosity", unit: "mPa s" }),
  };
  const own = await asked.quantity("temperature", { kind: "temperature", unit: "degC" });
  const result = asked.result(() => {
    const grade = gradeOf(oil);
    const temperatures = [...new Set([...usualTemperatures, ...(own === undefined ? [] : [own])])].sort(
      (a, b) => a - b,
    );
    return {
      rows: [
        { what: "viscosity index", value: String(viscosityIndex(oil).index) },
        { what: "SAE grade by its viscosity at 100 °C", value: grade.summer ?? "none of J300" },
      ],
      disagreements: grade.disagreements,
      chart: { name: "this oil", kv40: oil.kv40, kv100: oil.kv100 },
      points: temperatures.map((temperatureC) => {
        const at = oilAt(oil, temperatureC);
        return {
          temperature: String(Number(temperatureC.toFixed(1))),
          kinematic: at.kinematic.toPrecision(4),
          dynamic: (at.dynamic * 1e3).toPrecision(4),
          density: at.density.toFixed(1),
          outsideRange: at.outsideRange,
        };
      }),
    };
  });
  return { ...page, result };
}
