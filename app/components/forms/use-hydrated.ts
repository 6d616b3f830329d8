import { useSyncExternalStore } from "react";

const never = () => () => undefined;

/** Whether scripts have taken over the page: false while the server renders and until they have. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
