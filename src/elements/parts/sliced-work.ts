/** Work under way. After `stop` nothing more is heard of it. */
export interface Running {
  stop(): void;
}

/**
 * Hands an order to a worker.
 *
 * @param start throws where the page lets no worker start
 * @param heard takes what the worker says, and tells whether that was the last
 * @param refused called where the page lets no worker start, or its file is not there
 * @param moved what moves to the worker instead of being copied
 */
export function inWorker<Report>(start: () => Worker, order: unknown, heard: (report: Report) => 'more' | 'last', refused: () => void, moved: readonly Transferable[] = []): Running {
  let worker: Worker;
  try {
    worker = start();
  } catch {
    refused();
    return { stop: () => undefined };
  }
  worker.addEventListener('message', ({ data }: MessageEvent<Report>) => {
    if (heard(data) === 'last') worker.terminate();
  });
  // its own mistakes come as messages: this is a file that does not load, or a policy
  worker.addEventListener('error', (event) => {
    event.preventDefault();
    worker.terminate();
    refused();
  });
  worker.postMessage(order, [...moved]);
  return { stop: () => worker.terminate() };
}

/** Works in the page, slice by slice, and lets it breathe in between. */
export function inPage<Piece, Whole>(slices: Generator<Piece, Whole, void>, heard: { piece(piece: Piece): void; whole(whole: Whole): void; failed(error: string): void }): Running {
  let stopped = false;
  const next = (): void => {
    if (stopped) return;
    try {
      const { done, value } = slices.next();
      if (done) return heard.whole(value);
      heard.piece(value);
      setTimeout(next);
    } catch (error) {
      heard.failed(String(error));
    }
  };
  setTimeout(next);
  return {
    stop: () => {
      stopped = true;
    },
  };
}
