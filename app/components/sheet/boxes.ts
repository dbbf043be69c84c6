import type { Station } from "~/engineering/trade/fit-kinds";

/** A position of the fit on the sheet. */
export interface SheetPosition {
  id: string;
  number: number;
}

/** One box of the sheet: a station at a position. Its key is its name in the form that works without script. */
export interface SheetBox {
  key: string;
  position: SheetPosition;
  station: Station;
}

/** The order in which Enter walks the sheet: along one part, or one station through all parts. */
export type Travel = "position" | "station";

/** The name of a box: unique on the sheet, and what the server reads it back from. */
export function boxKey(positionId: string, station: Station): string {
  return `${positionId}.${station.feature}.${station.plane}.${station.axis}`;
}

const keyForm =
  /^([0-9a-f]{32})\.(bore|journal)\.(front|middle|rear)\.(vertical|plus45|minus45|horizontal|a|b)$/;

/** Reads a box's name; undefined where it is none. */
export function readBoxKey(key: string): { positionId: string; station: Station } | undefined {
  const [, positionId, feature, plane, axis] = keyForm.exec(key) ?? [];
  if (!positionId) return undefined;
  return { positionId, station: { feature, plane, axis } as Station };
}

/** The rows of the sheet, a position each, its boxes in the order of the stations. */
export function sheetRows(positions: readonly SheetPosition[], stations: readonly Station[]): SheetBox[][] {
  return positions.map((position) =>
    stations.map((station) => ({ key: boxKey(position.id, station), position, station })),
  );
}

/** All boxes in the order that Enter walks them. */
export function travelOrder(rows: readonly (readonly SheetBox[])[], travel: Travel): SheetBox[] {
  if (travel === "position") return rows.flat();
  const columns = rows[0]?.length ?? 0;
  return Array.from({ length: columns }, (_, column) => rows.map((row) => row[column]!)).flat();
}

/** Where a key of the keyboard leads from a box, in the grid pattern: edges do not wrap. */
export function neighbour(
  rows: readonly (readonly SheetBox[])[],
  from: { row: number; column: number },
  key: string,
  control: boolean,
): SheetBox | undefined {
  const lastRow = rows.length - 1;
  const lastColumn = (rows[0]?.length ?? 1) - 1;
  const { row, column } = from;
  const to = {
    ArrowUp: { row: row - 1, column },
    ArrowDown: { row: row + 1, column },
    ArrowLeft: { row, column: column - 1 },
    ArrowRight: { row, column: column + 1 },
    Home: control ? { row: 0, column: 0 } : { row, column: 0 },
    End: control ? { row: lastRow, column: lastColumn } : { row, column: lastColumn },
    PageUp: { row: 0, column },
    PageDown: { row: lastRow, column },
  }[key];
  return to && rows[to.row]?.[to.column];
}
