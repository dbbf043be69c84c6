/** What reading a box's text gives; the page decides by the core's rules. */
export interface TypedBox {
  valuePm: number | null;
  error?: string;
  warning?: { message: string; suggestion?: string };
}

/** A row's computed figures, as they stand in its last columns. */
export interface RowFigures {
  vertical: string;
  taper: string;
  outOfRound: string;
  uncertainty: string;
  window: { word: string; tone: "ok" | "watch" | "stop" | "none" };
}
