import type { FocusEvent, KeyboardEvent } from "react";
import { Form, Link, useLocation } from "react-router";

interface PersonMenuProps {
  personName: string;
  roleName: string;
  shopName: string;
}

const entry = "flex min-h-11 w-full items-center px-4 hover:bg-layout-wash cursor-pointer";

/** Who one is here, and the way to one's account and out. It opens before script; with it, Escape closes it. */
export function PersonMenu({ personName, roleName, shopName }: PersonMenuProps) {
  const { key } = useLocation();
  return (
    // A new page closes the menu.
    <details key={key} className="relative" onKeyDown={closeOnEscape} onBlur={closeWhenLeft}>
      <summary className="flex min-h-11 list-none flex-col justify-center text-right leading-tight [&::-webkit-details-marker]:hidden">
        <span className="flex items-center justify-end gap-1.5">
          {personName}
          <svg aria-hidden="true" viewBox="0 0 10 6" className="w-2.5 fill-none stroke-mute stroke-[1.5]">
            <path d="M1 1l4 4 4-4" />
          </svg>
        </span>
        <span className="text-dense text-mute">{roleName}</span>
      </summary>
      <div
        tabIndex={-1}
        className="absolute right-0 z-10 min-w-52 rounded border border-line bg-paper py-1 shadow-lg outline-none"
      >
        <p className="border-b border-line px-4 py-2 text-dense text-mute">
          {roleName}, {shopName}
        </p>
        <Link to="/account" className={entry}>
          Your account
        </Link>
        <Form method="post" action="/sign-out">
          <button type="submit" className={entry}>
            Sign out
          </button>
        </Form>
      </div>
    </details>
  );
}

function closeOnEscape(event: KeyboardEvent<HTMLDetailsElement>): void {
  const menu = event.currentTarget;
  if (event.key !== "Escape" || !menu.open) return;
  menu.open = false;
  menu.querySelector("summary")?.focus();
}

function closeWhenLeft(event: FocusEvent<HTMLDetailsElement>): void {
  if (!event.currentTarget.contains(event.relatedTarget)) event.currentTarget.open = false;
}
