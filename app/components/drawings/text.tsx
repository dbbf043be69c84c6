import type { ReactNode } from "react";
import { place } from "./scale";

type TextTone = "mute" | "ink" | "layout" | "bronze" | "watch" | "stop";

const fills: Record<TextTone, string> = {
  mute: "fill-mute",
  ink: "fill-ink",
  layout: "fill-layout",
  bronze: "fill-bronze",
  watch: "fill-watch",
  stop: "fill-stop",
};

interface TextProps {
  x: number;
  y: number;
  anchor?: "start" | "middle" | "end";
  tone?: TextTone;
  size?: number;
  /** Keeps lines that run under the letters away from them. */
  halo?: boolean;
  children: ReactNode;
}

/** Words in a drawing. */
export function Words(props: TextProps) {
  return <DrawnText {...props} face="" />;
}

/** A figure in a drawing: in the letters of all measured and computed figures. */
export function Figure(props: TextProps) {
  return <DrawnText {...props} face="font-mono" />;
}

function DrawnText({
  x,
  y,
  anchor,
  tone = "mute",
  size = 12,
  halo,
  face,
  children,
}: TextProps & { face: string }) {
  return (
    <text
      x={place(x)}
      y={place(y)}
      textAnchor={anchor}
      fontSize={size}
      className={`${face} ${fills[tone]} ${halo ? "stroke-plate [paint-order:stroke]" : ""}`.trim()}
      strokeWidth={halo ? 7 : undefined}
      strokeLinejoin={halo ? "round" : undefined}
    >
      {children}
    </text>
  );
}

/** About how wide words are drawn, in the drawing's own pixels: a letter of ours is 0.56 of its size on average. */
export function widthOf(words: string, size = 12): number {
  return words.length * size * 0.56;
}

/** Words cut to a width, with a mark that they were; empty where not even a letter has room. The table has them whole. */
export function cutTo(words: string, width: number, size = 12): string {
  if (widthOf(words, size) <= width) return words;
  const letters = Math.floor(width / (size * 0.56)) - 1;
  return letters < 2 ? "" : `${words.slice(0, letters).trimEnd()}…`;
}
