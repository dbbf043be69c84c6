import { memo, useEffect, useRef, useSyncExternalStore } from "react";
import { stationName } from "~/engineering/trade/fit-kinds";
import type { SheetBox } from "./boxes";
import type { RowFigures } from "./judgement";
import type { BoxState, SheetStore } from "./sheet-store";

interface SheetRowProps {
  row: readonly SheetBox[];
  index: number;
  title: string;
  store: SheetStore;
  frozen: boolean;
  before?: Record<string, string> | undefined;
  words: { bore: string; journal: string };
  figures: (row: readonly SheetBox[]) => RowFigures;
}

/** One position of the sheet: its boxes and what follows from them. Draws again only when one of its boxes changes. */
export const SheetRow = memo(function SheetRow({
  row,
  index,
  title,
  store,
  frozen,
  before,
  words,
  figures,
}: SheetRowProps) {
  // The boxes' states are fresh objects at each change, so their identity tells whether this row has changed.
  const seen = useRef<BoxState[]>([]);
  const states = useSyncExternalStore(store.subscribe, read, read);
  function read(): BoxState[] {
    const now = row.map((box) => store.box(box.key));
    if (now.length === seen.current.length && now.every((state, place) => state === seen.current[place])) {
      return seen.current;
    }
    seen.current = now;
    return now;
  }
  const computed = figures(row);
  return (
    <tr>
      <th scope="row" className="whitespace-nowrap text-left font-semibold">
        {title}
      </th>
      {row.map((box, column) => (
        <td
          key={box.key}
          role="gridcell"
          className={box.station.feature === row[column - 1]?.station.feature ? "" : "sheet-edge"}
        >
          <Box
            box={box}
            state={states[column]!}
            label={`${title}, ${words[box.station.feature]}, ${stationName(box.station)}`}
            place={{ row: index, column }}
            isTabStop={index === 0 && column === 0}
            frozen={frozen}
          />
          {before && <span className="sheet-before">{before[box.key] ?? "–"}</span>}
        </td>
      ))}
      <td className="sheet-figure sheet-edge">{computed.vertical}</td>
      <td className="sheet-figure">{computed.taper}</td>
      <td className="sheet-figure">{computed.outOfRound}</td>
      <td className="sheet-figure">{computed.uncertainty}</td>
      <td className={`sheet-figure sheet-window-${computed.window.tone}`}>{computed.window.word}</td>
    </tr>
  );
});

interface BoxProps {
  box: SheetBox;
  state: BoxState;
  label: string;
  place: { row: number; column: number };
  isTabStop: boolean;
  frozen: boolean;
}

function Box({ box, state, label, place, isTabStop, frozen }: BoxProps) {
  const input = useRef<HTMLInputElement>(null);
  const trouble = state.error ?? state.warning?.message;

  // An undo or an answer of the server changes a box that nobody is typing in; the one being typed in is left alone.
  useEffect(() => {
    const element = input.current;
    if (element && element !== document.activeElement && element.value !== state.text)
      element.value = state.text;
  }, [state.text]);

  return (
    <input
      ref={input}
      name={box.key}
      defaultValue={state.text}
      aria-label={label}
      aria-invalid={state.error ? true : undefined}
      title={trouble}
      data-row={place.row}
      data-column={place.column}
      data-status={state.status}
      data-slip={state.warning ? "" : undefined}
      tabIndex={isTabStop ? 0 : -1}
      readOnly={frozen}
      inputMode="decimal"
      autoComplete="off"
      className="sheet-box"
    />
  );
}
