import { StrictMode, startTransition, useEffect } from "react";
import { hydrateRoot } from "react-dom/client";
import { HydratedRouter } from "react-router/dom";
import { wipeDrafts } from "./lib/drafts.ts";
import { mayWipeFloor, wipeFloor } from "./lib/floor/wipe-floor.ts";

// Before the router takes the form: whoever signs out leaves nothing behind in this browser.
document.addEventListener(
  "submit",
  (event) => {
    const { target } = event;
    if (!(target instanceof HTMLFormElement) || target.getAttribute("action") !== "/sign-out") return;
    if (mayWipeFloor()) {
      wipeDrafts();
      wipeFloor();
    } else {
      event.preventDefault();
      event.stopImmediatePropagation();
    }
  },
  { capture: true },
);

/** The application in the browser; the document says when its scripts answer. */
function Client() {
  useEffect(() => {
    document.documentElement.dataset["scripts"] = "at work";
    // A page that the server cannot be asked for then says so in our words. Not every site serves us over a connection that allows it.
    if (import.meta.env.PROD && "serviceWorker" in navigator)
      navigator.serviceWorker.register("/unreachable.js").catch(() => undefined);
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
