const WATCH_MS = 1_000;

/**
 * Calls `stop` once when this process is asked to end: by a signal, or because npm, which started it, is gone
 * (npm's shell does not hand a signal on).
 * @param {(signal: NodeJS.Signals) => void} stop
 */
export function whenAskedToEnd(stop) {
  let asked = false;
  const ask = (signal) => {
    if (asked) return;
    asked = true;
    stop(signal);
  };
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => ask(signal));
  if (process.env.npm_lifecycle_event === undefined) return;
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) ask("SIGTERM");
  }, WATCH_MS).unref();
}
