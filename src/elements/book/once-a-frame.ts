/** Calls back once for all that happens before the next frame; in a window that is not looked at, when it is looked at again. */
export function onceAFrame(what: () => void): () => void {
  let due = false;
  return () => {
    if (due) return;
    due = true;
    requestAnimationFrame(() => {
      due = false;
      what();
    });
  };
}
