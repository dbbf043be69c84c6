import { z } from "zod";
import type { PageUnits } from "~/engineering/quantity/figures";
import { note, quantity, text, wholeBetween } from "~/routes/form-fields";

/** What the form that sets an engine up takes; the server and the page check by the same rules. */
export const engineForm = (units: PageUnits) =>
  z.object({
    name: text("Give the engine a name."),
    form: z.enum(["inline", "V", "flat"], { error: "Choose a layout." }),
    cylinders: wholeBetween(1, 16, "1 to 16 cylinders."),
    mains: wholeBetween(1, 17, "1 to 17 main bearings."),
    valvesPerCylinder: wholeBetween(2, 6, "2 to 6 valves."),
    bore: quantity("length", units === "inch" ? "in" : "mm"),
    stroke: quantity("length", units === "inch" ? "in" : "mm"),
    rodLength: quantity("length", units === "inch" ? "in" : "mm"),
    revLimitRpm: wholeBetween(500, 25_000, "500 to 25 000 rpm."),
    duty: note(120),
    environment: z.enum(["clean", "dusty"], { error: "Say where it runs." }),
  });

export interface EngineForm {
  in: z.input<ReturnType<typeof engineForm>>;
  out: z.output<ReturnType<typeof engineForm>>;
}
