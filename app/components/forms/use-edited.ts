import { useLayoutEffect, useState } from "react";

/** Name of the buttons that add, move or take out a row of a form. */
const INTENT = "__intent__";

/**
 * Whether somebody has typed into a form since its page was opened, or changed its rows. The form's own library compares with the record
 * instead, of which a form may show a part.
 */
export function useEdited(formId: string): boolean {
  const [edited, setEdited] = useState(false);
  // Before `useRecordForm` tells what was typed before the scripts came.
  useLayoutEffect(() => {
    const typed = ({ target }: Event) => {
      if (target instanceof Element && "form" in target && target.form === document.getElementById(formId))
        setEdited(true);
    };
    const pressed = ({ target }: Event) => {
      const button = target instanceof Element ? target.closest("button") : null;
      if (button?.name === INTENT && button.form === document.getElementById(formId)) setEdited(true);
    };
    document.addEventListener("input", typed);
    document.addEventListener("click", pressed);
    return () => {
      document.removeEventListener("input", typed);
      document.removeEventListener("click", pressed);
    };
  }, [formId]);
  return edited;
}
