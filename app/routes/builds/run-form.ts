import { addDays, isAfter, isValid, parseISO } from "date-fns";
import { z } from "zod";
import type { PageUnits } from "~/engineering/quantity/figures";
import { runEvents, runKinds } from "~/engineering/trade/condition";
import { note, numberBetween, optionalNumber, optionalQuantity, text } from "~/routes/form-fields";

const day = z
  .string()
  .trim()
  .regex(/^\d{4}-\d{2}-\d{2}(T\d{2}:\d{2})?$/, "Type the day as year-month-day: 2026-05-30.")
  .transform((typed, context): Date => {
    const date = parseISO(typed);
    if (!isValid(date)) context.addIssue({ code: "custom", message: "There is no such day." });
    // A day's grace: the shop's clock and the server's may stand in different time zones.
    else if (isAfter(date, addDays(new Date(), 1))) {
      context.addIssue({
        code: "custom",
        message: "This day is in the future; a run is logged when it has been run.",
      });
    }
    return date;
  });

const temperature = optionalQuantity("temperature", "degC").refine(
  (value) => value === undefined || (value.si >= -40 && value.si <= 200),
  "Oil runs between −40 and 200 °C; look at the value and its unit.",
);

/** What the run log takes; the server and the page check by the same rules. */
export const runForm = (units: PageUnits) =>
  z.object({
    kind: z.enum(runKinds, { error: "Say what kind of run it was." }),
    startedAt: day,
    hours: numberBetween(0, 1000, "Hours are a number from 0 to 1000."),
    laps: optionalNumber(0, 100_000, "Laps are a number from 0 up."),
    starts: optionalNumber(0, 10_000, "Starts are a number from 0 up."),
    topSpeedRpm: optionalNumber(100, 30_000, "The top speed of the crank is between 100 and 30 000 rpm."),
    oilId: text("Choose the oil it ran on."),
    oilTemperature: temperature,
    pressureIdle: optionalQuantity("pressure", units === "inch" ? "psi" : "bar"),
    pressureAtSpeed: optionalQuantity("pressure", units === "inch" ? "psi" : "bar"),
    pressureAtSpeedRpm: optionalNumber(100, 30_000, "The speed of the crank is between 100 and 30 000 rpm."),
    events: z
      .union([z.enum(runEvents).transform((event) => [event]), z.array(z.enum(runEvents))])
      .default([]),
    note: note(),
  });
