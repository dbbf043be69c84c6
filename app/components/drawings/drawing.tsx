import type { ReactNode } from "react";

interface DrawingProps {
  title: string;
  /** One sentence that says what the drawing shows. */
  summary: string;
  width: number;
  height: number;
  /** The same figures as a table: its head and its body. */
  table?: { head: string[]; rows: (string | number)[][] };
  children: ReactNode;
}

/** The frame of every drawing: named and summed up for who cannot see it, its figures one key away. */
export function Drawing({ title, summary, width, height, table, children }: DrawingProps) {
  return (
    <figure className="m-0">
      <svg
        role="img"
        aria-label={`${title}. ${summary}`}
        viewBox={`0 0 ${width} ${height}`}
        className="block h-auto w-full"
        style={{ maxWidth: width }}
      >
        {children}
      </svg>
      {table && (
        <details className="text-[13px] text-mute">
          <summary className="inline-flex min-h-6 cursor-pointer items-center">Figures</summary>
          <table className="figures my-2 max-w-2xl">
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
      )}
    </figure>
  );
}
