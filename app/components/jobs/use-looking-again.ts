import { useEffect } from "react";
import { useRevalidator } from "react-router";

/** A person sees no more often how far something is, milliseconds. */
const LOOK_AGAIN = 1_000;

/** Looks again while something is under way, and not while the page is hidden. */
export function useLookingAgain(isUnderWay: boolean): void {
  const { revalidate } = useRevalidator();
  useEffect(() => {
    if (!isUnderWay) return;
    const timer = setInterval(() => {
      if (!document.hidden) void revalidate();
    }, LOOK_AGAIN);
    return () => clearInterval(timer);
  }, [isUnderWay, revalidate]);
}
