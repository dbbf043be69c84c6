/** What something means for the engine: nothing wrong, worth a look, not to be passed over. */
export type Tone = "ok" | "watch" | "stop";

const shapes: Record<Tone, { colour: string; outline: string; sign: string }> = {
  ok: { colour: "text-ok", outline: "M8 1.2a6.8 6.8 0 1 0 .01 0z", sign: "M4.8 8.3l2.2 2.3 4.2-4.9" },
  watch: { colour: "text-watch", outline: "M8 1.4L15.2 14.4H.8z", sign: "M8 6v4M8 11.4v1.4" },
  stop: {
    colour: "text-stop",
    outline: "M5.2 1.2h5.6l4 4v5.6l-4 4H5.2l-4-4V5.2z",
    sign: "M5.4 5.4l5.2 5.2M10.6 5.4l-5.2 5.2",
  },
};

/** The glyph of a tone, each with an outline of its own so that it reads without its colour; a word stands beside it. */
export function ToneGlyph({ tone }: { tone: Tone }) {
  const { colour, outline, sign } = shapes[tone];
  return (
    <svg aria-hidden="true" viewBox="0 0 16 16" className={`inline-block size-[1.05em] shrink-0 ${colour}`}>
      <path d={outline} fill="currentColor" />
      <path d={sign} fill="none" strokeWidth="1.8" className="stroke-paper" />
    </svg>
  );
}
