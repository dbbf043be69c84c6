import { type FocusEvent, type KeyboardEvent, useRef } from "react";
import type { Station } from "~/engineering/trade/fit-kinds";
import { stationName } from "~/engineering/trade/fit-kinds";
import { neighbour, type SheetBox, type SheetPosition, sheetRows, type Travel, travelOrder } from "./boxes";
import type { RowFigures, TypedBox } from "./judgement";
import { SheetRow } from "./sheet-row";
import type { SheetStore } from "./sheet-store";

export interface SheetGridProps {
  label: string;
  positionWord: string;
  boreWord: string;
  journalWord: string;
  unitLabel: string;
  positions: readonly SheetPosition[];
  stations: readonly Station[];
  store: SheetStore;
  travel: Travel;
  frozen: boolean;
  /** As-built values, shown small under a teardown's boxes. */
  before?: Record<string, string> | undefined;
  readBox: (box: SheetBox, text: string) => TypedBox;
  figures: (row: readonly SheetBox[]) => RowFigures;
  onActive: (box: SheetBox) => void;
}

/**
 * The reading grid, by the WAI-ARIA grid pattern: one stop for Tab, arrows move without wrapping, typing replaces,
 * F2 edits, Escape restores, Enter commits and walks on, Shift+Enter walks back, Ctrl+Z takes back across boxes.
 * Each box is an input of a form, so that it works before script too. Focus moves in the key's own event: a gauge that
 * types faster than the page draws still lands in the right box.
 */
export function SheetGrid(props: SheetGridProps) {
  const { positions, stations, store, travel, frozen, readBox, onActive } = props;
  const rows = sheetRows(positions, stations);
  const order = travelOrder(rows, travel);
  const editing = useRef(false);
  const grid = useRef<HTMLTableElement>(null);

  const input = (key: string | undefined) =>
    key === undefined ? null : grid.current?.querySelector<HTMLInputElement>(`input[name="${key}"]`);

  const goTo = (box: SheetBox | undefined) => {
    const next = input(box?.key);
    next?.focus();
    next?.select();
  };

  const commit = (box: SheetBox, element: HTMLInputElement) => {
    const text = element.value.trim();
    editing.current = false;
    if (frozen || text === store.box(box.key).text) return;
    store.commit(box.key, { text, error: undefined, warning: undefined, ...readBox(box, text) });
  };

  const onKeyDown = (event: KeyboardEvent<HTMLTableElement>) => {
    const element = event.target;
    if (!(element instanceof HTMLInputElement)) return;
    const { row, column } = element.dataset;
    const place = { row: Number(row), column: Number(column) };
    const box = rows[place.row]?.[place.column];
    if (!box) return;
    const stop = () => event.preventDefault();

    if (event.key === "Enter") {
      stop();
      commit(box, element);
      goTo(order[order.findIndex((other) => other.key === box.key) + (event.shiftKey ? -1 : 1)]);
      return;
    }
    if (event.key === "Tab") {
      commit(box, element);
      return;
    }
    if (event.key === "Escape") {
      stop();
      element.value = store.box(box.key).text;
      editing.current = false;
      element.select();
      return;
    }
    if (event.key === "F2") {
      stop();
      editing.current = !editing.current;
      if (editing.current) element.setSelectionRange(element.value.length, element.value.length);
      else element.select();
      return;
    }
    if (event.key.toLowerCase() === "z" && (event.ctrlKey || event.metaKey) && !event.shiftKey) {
      // A box that is being typed into takes its own letters back first.
      if (element.value.trim() !== store.box(box.key).text) return;
      stop();
      const undone = store.undo();
      const target = undone === undefined ? null : input(undone);
      if (target && undone !== undefined) {
        target.value = store.box(undone).text;
        target.focus();
        target.select();
      }
      return;
    }
    const horizontal =
      event.key === "ArrowLeft" || event.key === "ArrowRight" || event.key === "Home" || event.key === "End";
    if (editing.current && horizontal) return;
    const next = neighbour(rows, place, event.key, event.ctrlKey || event.metaKey);
    if (next) {
      stop();
      commit(box, element);
      goTo(next);
    }
  };

  const onFocus = (event: FocusEvent<HTMLTableElement>) => {
    const element = event.target;
    if (!(element instanceof HTMLInputElement)) return;
    const box = rows[Number(element.dataset.row)]?.[Number(element.dataset.column)];
    if (!box) return;
    // Set on the elements themselves: a focus must not draw the sheet again.
    grid.current?.querySelector('input[tabindex="0"]')?.setAttribute("tabindex", "-1");
    element.setAttribute("tabindex", "0");
    onActive(box);
    element.select();
  };

  const onBlur = (event: FocusEvent<HTMLTableElement>) => {
    const element = event.target;
    if (!(element instanceof HTMLInputElement)) return;
    const box = rows[Number(element.dataset.row)]?.[Number(element.dataset.column)];
    if (box) commit(box, element);
  };

  const bores = stations.filter((station) => station.feature === "bore");
  const journals = stations.filter((station) => station.feature === "journal");
  return (
    <table
      ref={grid}
      role="grid"
      aria-label={props.label}
      className="sheet w-full border-collapse text-[13px]"
      onKeyDown={onKeyDown}
      onFocus={onFocus}
      onBlur={onBlur}
    >
      <thead>
        <tr>
          <td />
          {bores.length > 0 && (
            <th scope="colgroup" colSpan={bores.length} className="sheet-group">
              {props.boreWord}, {props.unitLabel}
            </th>
          )}
          {journals.length > 0 && (
            <th scope="colgroup" colSpan={journals.length} className="sheet-group">
              {props.journalWord}, {props.unitLabel}
            </th>
          )}
          <th scope="colgroup" colSpan={5} className="sheet-group">
            Clearance
          </th>
        </tr>
        <tr>
          <th scope="col">
            <span className="sr-only">position</span>
          </th>
          {stations.map((station, index) => (
            <th
              key={`${station.feature} ${stationName(station)}`}
              scope="col"
              className={edge(stations, index)}
            >
              {stationName(station)}
            </th>
          ))}
          <th scope="col" className="sheet-edge">
            vertical
          </th>
          <th scope="col">taper</th>
          <th scope="col">out of round</th>
          <th scope="col">sure to</th>
          <th scope="col">window</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <SheetRow
            key={row[0]!.position.id}
            row={row}
            index={index}
            title={`${props.positionWord} ${row[0]!.position.number}`}
            store={store}
            frozen={frozen}
            before={props.before}
            words={{ bore: props.boreWord, journal: props.journalWord }}
            figures={props.figures}
          />
        ))}
      </tbody>
    </table>
  );
}

/** A line before the first box of the bore and of the journal. */
export function edge(stations: readonly Station[], index: number): string {
  return stations[index]?.feature === stations[index - 1]?.feature ? "" : "sheet-edge";
}
