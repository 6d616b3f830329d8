import { useEffect } from "react";

/** All of the floor, its first page included, which has no slash at its end. */
const SCOPE = "/floor";

/**
 * Has pages of the floor kept on the device, so that they can be read through a lost connection.
 * @param paths of the pages
 */
export function useFloorWorker(paths: readonly string[]): void {
  const all = paths.join(" ");
  useEffect(() => {
    if (!import.meta.env.PROD || !("serviceWorker" in navigator)) return;
    if (document.documentElement.dataset["keptAt"] !== undefined) return;
    navigator.serviceWorker
      .register("/floor-worker.js", { scope: SCOPE })
      .then(activeWorker)
      .then((worker) => worker?.postMessage({ keep: all.split(" ") }))
      .catch(() => undefined);
  }, [all]);
}

function activeWorker(registration: ServiceWorkerRegistration): Promise<ServiceWorker | null> {
  const coming = registration.installing ?? registration.waiting;
  if (registration.active || !coming) return Promise.resolve(registration.active);
  return new Promise((resolve) => {
    coming.addEventListener("statechange", () => {
      if (coming.state === "activated") resolve(coming);
    });
  });
}
