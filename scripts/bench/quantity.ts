import { format, formatLength } from "../../app/engineering/quantity/format";
import { parseQuantity } from "../../app/engineering/quantity/parse";
import { checkSlip } from "../../app/engineering/quantity/slip";
import { type Measurement, typically } from "./typically";

const goal = 20e-6;
const repeats = 2000;

const typed = ["2.1000", "53,34 mm", "25 tenths", "1 7/8 in", "+3 tenths", ".0025", "12 µin", "53.3400 mm"];
const stored = [53_340_000_000, 63_500_000, 304_800, 47_625_000_000];
const expectation = { expected: 62_230_000_000, nominal: 62_230_000_000, band: 254_000_000 };

/** The speed goals of reading and writing quantities, in half a second. */
export function bench(): Measurement[] {
  const options = { defaultUnit: "in", nominal: 53_340_000_000 } as const;
  return [
    {
      what: "parse one length",
      goal,
      seconds: typically(repeats, (repeat) =>
        parseQuantity(typed[repeat % typed.length]!, "length", options),
      ),
    },
    {
      what: "parse one pressure",
      goal,
      seconds: typically(repeats, () => parseQuantity("62.5 psi", "pressure")),
    },
    {
      what: "format one length",
      goal,
      seconds: typically(repeats, (repeat) => formatLength(stored[repeat % stored.length]!, "in", 5)),
    },
    { what: "format one pressure", goal, seconds: typically(repeats, () => format(430_922.3, "psi", 1)) },
    {
      what: "a reading as it is typed: parse and look for a slip (none)",
      goal,
      seconds: typically(repeats, () =>
        checkSlip(parseQuantity("2.4497 in", "length").picometres!, expectation),
      ),
    },
  ];
}
