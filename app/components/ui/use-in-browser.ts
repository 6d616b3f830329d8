import { useSyncExternalStore } from "react";

/** False on the server and while its page is taken over, true from then on: for what only scripts can do. */
export function useInBrowser(): boolean {
  return useSyncExternalStore(
    subscribeToNothing,
    () => true,
    () => false,
  );
}

function subscribeToNothing() {
  return () => undefined;
}
