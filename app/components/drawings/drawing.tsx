import { type ReactNode, useId } from "react";

/** The figures of a drawing as a table. */
export interface DrawingTable {
  head: readonly string[];
  rows: readonly (readonly (string | number)[])[];
}

interface DrawingProps {
  title: string;
  /** One sentence that says what the drawing shows. */
  summary: string;
  width: number;
  height: number;
  table?: DrawingTable | undefined;
  /** Below this many pixels the drawing is moved sideways and not made smaller, so that its letters stay readable. */
  leastWidth?: number | undefined;
  children: ReactNode;
}

/** The frame of every drawing: named and summed up for who cannot see it, its figures one key away. */
export function Drawing({ title, summary, width, height, table, leastWidth, children }: DrawingProps) {
  const id = useId();
  return (
    // What moves sideways must have something in it that a key reaches: its figures.
    <figure className={table && "overflow-x-auto"}>
      <svg
        role="img"
        aria-labelledby={`${id}-title`}
        aria-describedby={`${id}-summary`}
        viewBox={`0 0 ${width} ${height}`}
        className="block h-auto w-full"
        style={{ maxWidth: width, minWidth: table && (leastWidth ?? Math.round(width * 0.75)) }}
      >
        <title id={`${id}-title`}>{title}</title>
        <desc id={`${id}-summary`}>{summary}</desc>
        {children}
      </svg>
      {table && <Figures summary={summary} table={table} />}
    </figure>
  );
}

function Figures({ summary, table }: { summary: string; table: DrawingTable }) {
  return (
    <details className="text-dense text-mute print:hidden">
      <summary className="target inline-flex items-center gap-1.5 underline decoration-line-strong underline-offset-2 hover:text-ink">
        Figures
      </summary>
      <table className="figures my-2 max-w-2xl text-ink">
        <caption>{summary}</caption>
        <thead>
          <tr>
            {table.head.map((head) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map(([first, ...rest]) => (
            <tr key={String(first)}>
              <th scope="row">{first}</th>
              {rest.map((cell, index) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: a cell has no name but its column
                <td key={index}>{cell}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </details>
  );
}
