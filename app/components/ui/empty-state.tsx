import type { ReactNode } from "react";

interface EmptyStateProps {
  /** What is not there yet, as a sentence. */
  title: string;
  /** Why it matters and how it comes to be there, and the button that starts it. */
  children: ReactNode;
}

/** What a page says when it has nothing to show yet: why, and what to do. */
export function EmptyState({ title, children }: EmptyStateProps) {
  return (
    <section className="max-w-xl border-y border-line py-8">
      <h2 className="mb-2 text-lg font-semibold">{title}</h2>
      <div className="grid justify-items-start gap-4 text-mute">{children}</div>
    </section>
  );
}
