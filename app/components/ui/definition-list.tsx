import type { ReactNode } from "react";

interface DefinitionListProps {
  items: readonly {
    term: string;
    detail: ReactNode;
    /** The detail is a measured or computed figure. */
    figure?: boolean;
    unit?: string | undefined;
  }[];
}

/** What is known of one thing, term beside detail. */
export function DefinitionList({ items }: DefinitionListProps) {
  return (
    <dl className="grid max-w-3xl grid-cols-[max-content_minmax(0,1fr)] gap-x-6 border-t border-line">
      {items.map(({ term, detail, figure, unit }) => (
        <div
          key={term}
          className="col-span-2 grid grid-cols-subgrid items-baseline border-b border-line py-2"
        >
          <dt className="text-mute">{term}</dt>
          <dd>
            <span className={figure ? "font-mono" : undefined}>{detail}</span>
            {unit && <span className="text-dense text-mute"> {unit}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
