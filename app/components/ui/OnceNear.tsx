import { useEffect, useRef, useState, type ReactNode } from "react";

/** How far outside of what is seen it counts as near: what it needs is there before it is. */
const NEAR = "400px";

interface Props {
  /** keeps the place, so that nothing moves when the children come */
  className: string;
  children: ReactNode;
}

/** Children that come once the reader is near, and stay. */
export function OnceNear({ className, children }: Props) {
  const place = useRef<HTMLDivElement>(null);
  const [near, setNear] = useState(false);
  useEffect(() => {
    if (near || place.current === null) return undefined;
    const observer = new IntersectionObserver((seen) => seen.some((entry) => entry.isIntersecting) && setNear(true), {
      rootMargin: NEAR,
    });
    observer.observe(place.current);
    return () => observer.disconnect();
  }, [near]);
  return (
    <div ref={place} className={className}>
      {near && children}
    </div>
  );
}
