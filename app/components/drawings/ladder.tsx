import { Link } from "react-router";
import { inWords } from "~/engineering/trade/condition";
import { ConditionGlyph } from "./condition-glyph";

interface Rung {
  id: string;
  build: number;
  state: string;
  hours: number;
  oil?: string | undefined;
  /** Kinematic viscosity of the oil at 100 °C, mm²/s: it colours the rung, thin pale and thick dark. */
  kv100?: number | undefined;
  grade?: number | undefined;
  events: readonly string[];
  to: string;
}

interface LadderProps {
  title: string;
  rungs: readonly Rung[];
  /** The build this page is about. */
  current?: string;
}

// SAE J300: under 12.5 mm²/s at 100 °C is a 30 or thinner, from 16.3 a 50 or thicker.
function oilTone(kv100: number | undefined): string {
  if (kv100 === undefined) return "var(--line)";
  if (kv100 < 12.5) return "var(--oil-thin)";
  return kv100 < 16.3 ? "var(--oil-middle)" : "var(--oil-thick)";
}

/** An engine's history as a ladder, the newest rung on top: hours, oil, worst grade, what happened. */
export function Ladder({ title, rungs, current }: LadderProps) {
  return (
    <nav aria-label={title}>
      <h2 className="mb-2 text-lg font-semibold">{title}</h2>
      <ol className="grid">
        {rungs.map((rung) => (
          <li key={rung.id} className="grid grid-cols-[4.5rem_5rem_minmax(0,1fr)] items-center gap-2">
            <Link
              to={rung.to}
              aria-current={rung.id === current ? "page" : undefined}
              className="flex min-h-12 items-center aria-[current=page]:font-semibold aria-[current=page]:text-layout"
            >
              Build {rung.build}
            </Link>
            <span className="flex min-h-12 flex-col justify-center border-x-2 border-line text-center font-mono text-[11px] text-mute">
              {rung.hours > 0 ? `${rung.hours.toFixed(1)} h` : "–"}
              <span aria-hidden="true" className="block h-1.5" style={{ background: oilTone(rung.kv100) }} />
              {rung.oil ?? "\u00a0"}
            </span>
            <span className="flex items-center gap-2 text-[13px] text-mute">
              {rung.grade !== undefined && <ConditionGlyph grade={rung.grade} />}
              {rung.events.map(inWords).join(", ")}
            </span>
          </li>
        ))}
      </ol>
    </nav>
  );
}
