import type { ReactNode } from "react";
import { type Tone, ToneGlyph } from "./tone-glyph";

interface NoticeProps {
  tone: Tone;
  /** The whole of it in one sentence. */
  title: string;
  /** What to do about it. */
  children?: ReactNode;
}

const looks: Record<Tone, { word: string; frame: string }> = {
  ok: { word: "Done", frame: "border-ok bg-ok-wash" },
  watch: { word: "Watch", frame: "border-watch bg-watch-wash" },
  stop: { word: "Stop", frame: "border-stop bg-stop-wash" },
};

/** Something the person should know, said by word, glyph and colour alike, and announced when it appears. */
export function Notice({ tone, title, children }: NoticeProps) {
  const { word, frame } = looks[tone];
  return (
    <div role="status" className={`mb-5 flex max-w-3xl gap-3 border-l-4 px-4 py-3 ${frame}`}>
      <span className="pt-0.5 text-lg leading-none">
        <ToneGlyph tone={tone} />
      </span>
      <div className="grid justify-items-start gap-1">
        <p className="font-semibold">
          <span className="sr-only">{word}: </span>
          <span>{title}</span>
        </p>
        {children}
      </div>
    </div>
  );
}
