import { lineWeight } from "./line-weight";
import { Words, widthOf } from "./text";

type Mark = "built" | "torn" | "aim" | "target" | "window" | "mean";

const words: Record<Mark, string> = {
  built: "as built",
  torn: "torn down",
  aim: "aim",
  target: "aim",
  window: "window",
  mean: "mean as built",
};

/** What the marks of a drawing mean, in a line from left to right. */
export function MarkKey({ x, y, marks }: { x: number; y: number; marks: readonly Mark[] }) {
  const starts = marks.map((_, index) =>
    marks.slice(0, index).reduce((sum, mark) => sum + widthOf(words[mark]) + 38, x),
  );
  return (
    <g>
      {marks.map((mark, index) => (
        <g key={mark}>
          <Sample mark={mark} x={starts[index]!} y={y - 4} />
          <Words x={starts[index]! + 20} y={y}>
            {words[mark]}
          </Words>
        </g>
      ))}
    </g>
  );
}

function Sample({ mark, x, y }: { mark: Mark; x: number; y: number }) {
  switch (mark) {
    case "built":
      return <circle cx={x + 8} cy={y} r="3.2" className="fill-bronze" />;
    case "torn":
      return (
        <circle
          cx={x + 8}
          cy={y}
          r="3.2"
          strokeWidth={lineWeight.mark}
          className="fill-plate stroke-bronze"
        />
      );
    case "aim":
      return <path d={`M${x + 8} ${y + 4}l-5.5 -9h11z`} className="fill-bronze" />;
    case "target":
      return <path d={`M${x} ${y}h16`} strokeWidth={lineWeight.mark} className="stroke-layout" />;
    case "mean":
      return <path d={`M${x} ${y}h16`} strokeWidth={lineWeight.mark} className="stroke-bronze opacity-60" />;
    case "window":
      return (
        <path
          d={`M${x} ${y - 4}h16M${x} ${y + 4}h16`}
          strokeWidth={lineWeight.hair}
          strokeDasharray="2 3"
          className="stroke-line-strong"
        />
      );
  }
}
