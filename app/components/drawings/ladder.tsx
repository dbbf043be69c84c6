import { Link } from "react-router";
import type { PageUnits } from "~/engineering/quantity/figures";
import { picometres } from "~/engineering/quantity/length";
import { inWords } from "~/engineering/trade/condition";
import { ConditionGlyph } from "./condition-glyph";
import { oilTone } from "./oil-tone";
import { stepSize } from "./step-words";

interface Rung {
  id: string;
  build: number;
  state: string;
  hours: number;
  oil?: string | undefined;
  /** Kinematic viscosity of the oil at 100 °C, mm²/s: it colours the rung, thin pale and thick dark. */
  kv100?: number | undefined;
  grade?: number | undefined;
  /** What happened in its runs, such as debris. */
  events: readonly string[];
  /** Signed change of the aim from the build before, m; 0 where it was held. */
  step?: number | undefined;
  to: string;
}

interface LadderProps {
  title: string;
  /** Newest first. */
  rungs: readonly Rung[];
  /** The build this page is about. */
  current?: string;
  /** In which the steps are written. */
  units?: PageUnits;
}

/** A history as a ladder, the newest rung on top: hours, oil, worst grade, what happened, and the step from rung to rung. */
export function Ladder({ title, rungs, current, units = "inch" }: LadderProps) {
  return (
    <nav aria-label={title}>
      <h2 className="mb-2 text-lg font-semibold">{title}</h2>
      {rungs.length === 0 && (
        <p className="text-mute">No build yet: its first rung comes with the first build.</p>
      )}
      <ol>
        {rungs.map((rung) => (
          <li
            key={rung.id}
            className="relative grid grid-cols-[4rem_6.25rem_minmax(0,1fr)] gap-x-2.5 hover:bg-plate-deep"
          >
            <Link
              to={rung.to}
              aria-current={rung.id === current ? "page" : undefined}
              className="flex h-12 items-center justify-end after:absolute after:inset-0 aria-[current=page]:font-semibold aria-[current=page]:text-layout"
            >
              Build {rung.build}
            </Link>
            <RungOnRails rung={rung} units={units} />
            <span className="flex h-12 items-center gap-2 text-dense leading-tight text-mute">
              {rung.grade !== undefined && <ConditionGlyph grade={rung.grade} />}
              <span>
                {rung.oil && (
                  <span className="block whitespace-nowrap font-mono text-[0.6875rem]">{rung.oil}</span>
                )}
                {wordsOf(rung)}
              </span>
            </span>
          </li>
        ))}
      </ol>
    </nav>
  );
}

function wordsOf({ events, grade, state }: Rung): string {
  if (events.length > 0) return events.map(inWords).join(", ");
  return grade === undefined ? inWords(state) : "";
}

/** The rung between its rails: its hours over it, the step that led to it from the rung below under it. */
function RungOnRails({ rung, units }: { rung: Rung; units: PageUnits }) {
  const { hours, kv100, step } = rung;
  const hasRun = hours > 0;
  return (
    <span className="flex min-h-12 flex-col border-x-2 border-line text-center font-mono text-[0.6875rem] leading-none text-mute">
      <span className="flex h-5 items-end justify-center pb-0.5">
        {hasRun ? `${hours.toFixed(1)} h` : ""}
      </span>
      <span
        aria-hidden="true"
        className={`block h-[7px] border-y ${hasRun ? "border-bronze" : "border-dashed border-line-strong"}`}
        style={hasRun ? { background: oilTone(kv100) } : undefined}
      />
      {step !== undefined && <StepBelow step={step} units={units} />}
    </span>
  );
}

function StepBelow({ step, units }: { step: number; units: PageUnits }) {
  const [word, colour, arrow] =
    picometres(step) === 0
      ? ["held", "", "M2 4h8"]
      : step < 0
        ? ["closed", "text-layout", "M11 4H2M5 1L2 4l3 3"]
        : ["opened", "text-watch", "M1 4h9M7 1l3 3-3 3"];
  return (
    <span
      className={`flex items-center justify-center gap-1 whitespace-nowrap pt-3 pb-2 font-sans text-[0.75rem] ${colour}`}
    >
      <svg aria-hidden="true" viewBox="0 0 12 8" className="w-3 fill-none stroke-current stroke-[1.5]">
        <path d={arrow} />
      </svg>
      <span>
        {word}
        {picometres(step) !== 0 && (
          <span className="font-mono text-[0.6875rem]"> {stepSize(step, units)}</span>
        )}
      </span>
    </span>
  );
}
