import { useEffect } from "react";
import { useOnDemand } from "#app/components/layout/use-on-demand.tsx";

const loadKeys = () => import("./KeysDialog.tsx");

/** Shows the keys of the program at '?': outside of fields and dialogs, and only for who has not switched single keys off. */
export function KeysOpener({ singleKeys }: { singleKeys: boolean }) {
  const { dialog, show } = useOnDemand(loadKeys, "/method#keys");
  useEffect(() => {
    if (!singleKeys) return undefined;
    const press = (event: KeyboardEvent) => {
      if (event.key !== "?" || event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return;
      if (event.target instanceof Element && event.target.closest("input, textarea, select, dialog, [contenteditable]"))
        return;
      event.preventDefault();
      show();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [show, singleKeys]);
  return dialog;
}
