const unsent = (): number => {
  try {
    return Number(localStorage.getItem("floor-unsent") ?? 0);
  } catch {
    return 0;
  }
};

/** Whether somebody who signs out means it, where entries of the floor would go unsent with them. */
export function mayWipeFloor(): boolean {
  const count = unsent();
  if (count === 0) return true;
  const what = count === 1 ? "1 entry of the floor has" : `${count} entries of the floor have`;
  return window.confirm(
    `${what} not been sent, and signing out takes ${count === 1 ? "it" : "them"} off this device. Sign out all the same?`,
  );
}

/** Takes kept sheets and the queue of the floor off this device, whoever they were of. */
export function wipeFloor(): void {
  try {
    localStorage.removeItem("floor-unsent");
    indexedDB.deleteDatabase("floor");
    void caches.keys().then((names) => {
      for (const name of names) if (name.startsWith("floor-pages-")) void caches.delete(name);
    });
    // What is being kept right now would come after it.
    void navigator.serviceWorker
      .getRegistration("/floor/")
      .then((worker) => worker?.active?.postMessage({ forget: true }));
  } catch {
    // A browser that forbids its stores has nothing in them.
  }
}
