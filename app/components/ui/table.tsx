import type { ReactNode } from "react";

interface TableProps {
  caption: string;
  /** Where the page's title says the same, the caption is there for who cannot see that. */
  hideCaption?: boolean;
  children: ReactNode;
}

/**
 * A dense table: units in its heads, scrolling sideways by itself where it is too wide. Cells are figures; one of
 * words is `className="words"`, and a column of figures to be compared is `className="figure"`, head and cells.
 */
export function Table({ caption, hideCaption = false, children }: TableProps) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by key
    <section className="overflow-x-auto" tabIndex={0} aria-label={caption}>
      <table className="figures">
        <caption className={hideCaption ? "sr-only" : undefined}>{caption}</caption>
        {children}
      </table>
    </section>
  );
}
