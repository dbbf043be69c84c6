import { Link } from "react-router";

interface FitPickerProps {
  path: string;
  fits: { id: string; name: string; due: number; done: number }[];
  current: string;
}

/** Every fit of the build with what is left of it, one step away. */
export function FitPicker({ path, fits, current }: FitPickerProps) {
  return (
    <nav aria-label="Fits of this build" className="mb-5">
      <ul className="flex flex-wrap gap-x-6">
        {fits.map((fit) => (
          <li key={fit.id}>
            <Link
              to={`${path}?fit=${fit.id}`}
              aria-current={fit.id === current ? "page" : undefined}
              className="flex min-h-11 items-center gap-2 aria-[current=page]:font-semibold aria-[current=page]:text-layout"
            >
              {fit.name}
              <span className="font-mono text-[13px] text-mute">
                {fit.done}/{fit.due}
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
