import { startTransition, useEffect, useState } from "react";
import { flushSync } from "react-dom";

/** Something rests when it has stayed the same this long, ms. */
const REST = 500;

/**
 * A value for what nobody looks at while it changes, such as a drawing for paper: it follows once the value rests, and at the latest
 * when the page is printed.
 */
export function useRested<T>(value: T): T {
  const [rested, setRested] = useState(value);
  useEffect(() => {
    if (rested === value) return undefined;
    const put = () => setRested(() => value);
    const timer = setTimeout(() => startTransition(put), REST);
    const atOnce = () => flushSync(put);
    window.addEventListener("beforeprint", atOnce);
    return () => {
      clearTimeout(timer);
      window.removeEventListener("beforeprint", atOnce);
    };
  }, [rested, value]);
  return rested;
}
