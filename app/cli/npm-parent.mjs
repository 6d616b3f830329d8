import { inspect, isAlive } from "./processes.mjs";

const shells = new Set(["sh", "dash", "bash", "ash", "busybox", "ksh", "zsh"]);

/**
 * Tells when the npm that runs this script is gone. Between npm and the script stands a shell, on some systems, and
 * outlives npm: so both are watched. Does nothing where no npm runs the script.
 *
 * @param {() => void} onGone
 */
export function watchNpm(onGone) {
  if (!process.env.npm_lifecycle_event) return;
  const parent = inspect(process.ppid);
  const grandparent = parent && shells.has(parent.name) ? inspect(parent.parent) : undefined;
  const watched = [parent, grandparent].filter((found) => found !== undefined);
  const timer = setInterval(() => {
    if (watched.every(isAlive)) return;
    clearInterval(timer);
    onGone();
  }, 250);
  timer.unref();
}
