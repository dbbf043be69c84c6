import type { ReactNode } from "react";

/** What a page says when it has nothing to show yet: why, and what to do. */
export function EmptyState({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="max-w-xl border-y border-line py-7">
      <h2 className="mb-2 text-lg font-semibold">{title}</h2>
      <div className="grid justify-items-start gap-4 text-mute">{children}</div>
    </section>
  );
}
