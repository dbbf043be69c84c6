/** What stands in a box, and how far it has come. */
export interface BoxState {
  /** As it is shown and can be typed over. */
  text: string;
  /** The standing reading on the server; null for an empty box. */
  readingId: string | null;
  /** Exact value, pm; null where there is none that can be used. */
  valuePm: number | null;
  status: "empty" | "saved" | "waiting" | "refused";
  /** Why it was refused, or what looks like a slip; one sentence. */
  error?: string | undefined;
  warning?: { message: string; suggestion?: string | undefined } | undefined;
}

/** One box to send: what was typed into it, over which reading. */
export interface Entry {
  key: string;
  typed: string;
  supersedes: string | null;
  /** The slip that the person was shown and kept. */
  keptWarning?: string | undefined;
}

interface Undo {
  key: string;
  before: BoxState;
}

export const emptyBox: BoxState = { text: "", readingId: null, valuePm: null, status: "empty" };

const mostUndo = 200;

/**
 * The state of a sheet outside React's tree: a key stroke touches one box, so it must not render the other hundreds.
 * Rows subscribe to their own boxes.
 */
export class SheetStore {
  private readonly boxes = new Map<string, BoxState>();
  private readonly listeners = new Set<() => void>();
  private readonly undos: Undo[] = [];
  private queue: Entry[] = [];
  private version = 0;

  constructor(initial: Iterable<readonly [string, BoxState]>) {
    for (const [key, box] of initial) this.boxes.set(key, box);
  }

  /** For `useSyncExternalStore`. */
  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Changes with every change, for those who show all of it. */
  readonly currentVersion = (): number => this.version;

  box(key: string): BoxState {
    return this.boxes.get(key) ?? emptyBox;
  }

  /** How many boxes are waiting for the server. */
  get waiting(): number {
    return this.queue.length + this.sending.size;
  }

  private sending = new Set<string>();

  /** Puts a value in a box and in the queue to the server; what stood there can be undone. */
  commit(
    key: string,
    box: Pick<BoxState, "text" | "valuePm" | "warning" | "error">,
    keptWarning?: string,
  ): void {
    const before = this.box(key);
    this.undos.push({ key, before });
    if (this.undos.length > mostUndo) this.undos.shift();
    this.put(key, { ...before, ...box }, keptWarning);
  }

  /** Takes back the latest commit; tells which box it was. */
  undo(): string | undefined {
    const undo = this.undos.pop();
    if (!undo) return undefined;
    const { text, valuePm, warning, error } = undo.before;
    this.put(undo.key, { ...this.box(undo.key), text, valuePm, warning, error });
    return undo.key;
  }

  private put(key: string, box: BoxState, keptWarning?: string): void {
    const waiting = box.error === undefined;
    this.boxes.set(key, { ...box, status: waiting ? "waiting" : "refused" });
    // A box that waits already is sent with its newest text; it was never on the server in between.
    this.queue = this.queue.filter((entry) => entry.key !== key);
    if (waiting) this.queue.push({ key, typed: box.text, supersedes: box.readingId, keptWarning });
    this.changed();
  }

  /** The boxes to send now: each at most once, none that is on its way already. */
  takeQueue(most: number): Entry[] {
    const ready = this.queue.filter((entry) => !this.sending.has(entry.key)).slice(0, most);
    const keys = new Set(ready.map((entry) => entry.key));
    this.queue = this.queue.filter((entry) => !keys.has(entry.key));
    for (const key of keys) this.sending.add(key);
    return ready.map((entry) => ({ ...entry, supersedes: this.box(entry.key).readingId }));
  }

  /** What the server said of a box. */
  settle(key: string, answer: { readingId: string | null; error?: string | undefined }): void {
    this.sending.delete(key);
    const box = this.box(key);
    const waitsAgain = this.queue.some((entry) => entry.key === key);
    this.boxes.set(key, {
      ...box,
      readingId: answer.readingId,
      error: answer.error,
      status: waitsAgain ? "waiting" : answer.error ? "refused" : box.text === "" ? "empty" : "saved",
    });
    this.changed();
  }

  /** The server did not answer: what was on its way goes back to the head of the queue. */
  returnToQueue(entries: readonly Entry[]): void {
    for (const entry of entries) this.sending.delete(entry.key);
    const newer = new Set(this.queue.map((entry) => entry.key));
    this.queue = [...entries.filter((entry) => !newer.has(entry.key)), ...this.queue];
    this.changed();
  }

  private changed(): void {
    this.version += 1;
    for (const listener of this.listeners) listener();
  }
}
