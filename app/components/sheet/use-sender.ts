import { useEffect, useRef } from "react";
import { useFetcher } from "react-router";
import type { Entry, SheetStore } from "./sheet-store";

/** What became of one box: refused ones come back with what was typed and why. */
export interface BoxAnswer {
  key: string;
  readingId: string | null;
  refused?: { typed: string; error: string };
}

/** What the sheet's action answers for each box that was sent. */
export interface SheetAnswer {
  results?: BoxAnswer[];
  /** The server did not answer; nothing of this was saved. */
  unreachable?: boolean;
}

const mostAtOnce = 50;
const retryAfter = 2000;

/**
 * Sends what waits in the store, one batch at a time and in order, so that typing faster than the network loses nothing:
 * a batch that gets no answer goes back to the head of the queue and is sent again.
 * @param session what goes along with each batch: temperature, gauges
 */
export function useSender(store: SheetStore, session: Record<string, string>): { unreachable: boolean } {
  const fetcher = useFetcher<SheetAnswer>();
  const sent = useRef<Entry[]>([]);
  const sessionNow = useRef(session);
  sessionNow.current = session;

  useEffect(() => {
    const answer = fetcher.data;
    if (fetcher.state !== "idle" || sent.current.length === 0 || !answer) return;
    const batch = sent.current;
    sent.current = [];
    if (!answer.results) {
      store.returnToQueue(batch);
      return;
    }
    for (const { key, readingId, refused } of answer.results) {
      store.settle(key, { readingId, error: refused?.error });
    }
  }, [fetcher.state, fetcher.data, store]);

  useEffect(() => {
    const send = () => {
      if (fetcher.state !== "idle" || sent.current.length > 0) return;
      const batch = store.takeQueue(mostAtOnce);
      if (batch.length === 0) return;
      sent.current = batch;
      fetcher.submit(
        { ...sessionNow.current, intent: "entries", entries: JSON.stringify(batch) },
        { method: "post", defaultShouldRevalidate: false },
      );
    };
    if (!fetcher.data?.unreachable) send();
    const unsubscribe = store.subscribe(() => {
      if (!fetcher.data?.unreachable) send();
    });
    const again = fetcher.data?.unreachable ? setInterval(send, retryAfter) : undefined;
    return () => {
      unsubscribe();
      clearInterval(again);
    };
  }, [fetcher, fetcher.state, fetcher.data, store]);

  return { unreachable: fetcher.data?.unreachable ?? false };
}
