import { stationName } from "~/engineering/trade/fit-kinds";
import type { SheetBox } from "./boxes";
import type { BoxState } from "./sheet-store";

interface ReadOutProps {
  box: SheetBox | undefined;
  state: BoxState | undefined;
  title: string | undefined;
  /** What the box should hold by the target, with its band. */
  expected: { value: string; band: string } | undefined;
  /** Vertical clearance of the position as far as it is measured. */
  clearance: string | undefined;
  /** Whether everything is saved; said as it changes. */
  status: string;
  /** Takes the latest box back; for who has no Control key at hand. */
  onUndo?: (() => void) | undefined;
}

/** The box in hand, large enough to read at arm's length. */
export function ReadOut({ box, state, title, expected, clearance, status, onUndo }: ReadOutProps) {
  const figures = [
    {
      label: box && title ? `${title}, ${box.station.feature} ${stationName(box.station)}` : "No box chosen",
      value: state?.text || "–",
    },
    { label: "expected", value: expected?.value ?? "–", small: expected?.band },
    { label: "clearance so far, vertical", value: clearance ?? "–" },
  ];
  return (
    <div className="mb-4 border-y border-line bg-paper">
      <dl className="grid grid-cols-3">
        {figures.map(({ label, value, small }) => (
          <div key={label} className="border-l border-line px-4 py-3 first:border-l-0">
            <dt className="text-[13px] text-mute">{label}</dt>
            <dd className="font-mono text-[26px] leading-tight">
              {value} {small && <small className="text-[15px] text-mute">± {small}</small>}
            </dd>
          </div>
        ))}
      </dl>
      <div className="flex items-center justify-between border-t border-line px-4 text-[13px] text-mute">
        <p role="status" className="py-2">
          {status}
        </p>
        {onUndo && (
          <button type="button" className="min-h-11 cursor-pointer underline" onClick={onUndo}>
            Take the last one back
          </button>
        )}
      </div>
    </div>
  );
}
