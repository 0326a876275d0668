import { reportAndExit } from './run-command.mjs';

/**
 * Keeps what was started and stops it in reverse: the server before its database, the lock last. What is
 * still starting is waited for, so that a signal in the middle leaves nothing running.
 */
export function createSupervisor() {
  const stops = [];
  const starting = new Set();
  let stopping = false;

  async function runStops() {
    stopping = true;
    await Promise.allSettled([...starting]);
    while (stops.length > 0) await stops.pop()();
  }

  async function stop(code, reason) {
    if (stopping) return;
    stopping = true;
    if (reason) console.error(reason);
    await runStops();
    process.exit(code);
  }

  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop(0));

  return {
    get stopping() {
      return stopping;
    },
    onStop: (work) => stops.push(work),
    stop,
    runStops,
    /** Starts something whose stop is registered once it is up. */
    begin(work) {
      const begun = work();
      starting.add(begun);
      const forget = () => starting.delete(begun);
      begun.then(forget, forget);
      return begun;
    },
    /** Runs the whole start; a failure stops what was started and ends with one line or a stack. */
    async run(work) {
      try {
        await work();
      } catch (error) {
        if (stopping) return;
        await runStops();
        reportAndExit(error);
      }
    },
  };
}
