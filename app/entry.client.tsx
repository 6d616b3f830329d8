import { StrictMode, startTransition, useEffect } from "react";
import { hydrateRoot } from "react-dom/client";
import { HydratedRouter } from "react-router/dom";

/** The application in the browser; the document says when its scripts answer. */
function Client() {
  useEffect(() => {
    document.documentElement.dataset["scripts"] = "at work";
  }, []);
  return <HydratedRouter />;
}

startTransition(() => {
  hydrateRoot(
    document,
    <StrictMode>
      <Client />
    </StrictMode>,
  );
});
