import { useCallback, useState, type ComponentType } from "react";

type DialogView = ComponentType<{ onClose: () => void }>;

/**
 * A dialog that is loaded when it is first asked for.
 * @param load stays the same function
 * @param otherwise the page that shows the same, for when it does not load
 */
export function useOnDemand(load: () => Promise<{ default: DialogView }>, otherwise: string) {
  const [View, setView] = useState<DialogView | null>(null);
  const [open, setOpen] = useState(false);
  const show = useCallback(() => {
    setOpen(true);
    load().then(
      (loaded) => setView(() => loaded.default),
      () => window.location.assign(otherwise),
    );
  }, [load, otherwise]);
  const close = useCallback(() => setOpen(false), []);
  return { dialog: open && View ? <View onClose={close} /> : null, show };
}
