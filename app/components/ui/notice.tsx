import type { ReactNode } from "react";

type Tone = "ok" | "watch" | "stop";

const marks: Record<Tone, { sign: string; look: string }> = {
  ok: { sign: "✓", look: "border-ok" },
  watch: { sign: "!", look: "border-watch bg-watch-wash" },
  stop: { sign: "×", look: "border-stop bg-stop-wash" },
};

/** Something the person should know, by colour, sign and words alike. */
export function Notice({ tone, title, children }: { tone: Tone; title: string; children?: ReactNode }) {
  return (
    <div role="status" className={`mb-5 max-w-3xl border-l-4 px-4 py-3 ${marks[tone].look}`}>
      <p className="font-semibold">
        <span aria-hidden="true">{marks[tone].sign} </span>
        {title}
      </p>
      {children}
    </div>
  );
}
