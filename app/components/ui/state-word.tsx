import type { ReactNode } from "react";
import { type Tone, ToneGlyph } from "./tone-glyph";

interface StateWordProps {
  tone: Tone;
  /** The word itself: "in the window", "calibration due", "worn through". */
  children: ReactNode;
}

const colours: Record<Tone, string> = { ok: "text-ok", watch: "text-watch", stop: "text-stop" };

/** A state in a line or a cell: glyph, word and colour say the same. */
export function StateWord({ tone, children }: StateWordProps) {
  return (
    <span className={`inline-flex items-center align-bottom gap-1.5 whitespace-nowrap ${colours[tone]}`}>
      <ToneGlyph tone={tone} />
      {children}
    </span>
  );
}
