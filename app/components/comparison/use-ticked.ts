import { useState } from "react";

const boxesOf = (form: HTMLFormElement) =>
  [...form.elements].filter((each): each is HTMLInputElement => each instanceof HTMLInputElement && each.name === "of");

/**
 * The ids that are ticked; they outlast a turn of the list's page. The boxes themselves are asked, so that what was ticked before the
 * scripts came counts as well.
 */
export function useTicked() {
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set());
  const read = (form: HTMLFormElement | null) => {
    if (!form) return;
    const boxes = boxesOf(form).filter(({ type }) => type === "checkbox");
    setTicked((before) => {
      const next = new Set(before);
      for (const { value, checked } of boxes)
        if (checked) next.add(value);
        else next.delete(value);
      return next;
    });
  };
  const clear = (form: HTMLFormElement | null) => {
    for (const box of form ? boxesOf(form) : []) box.checked = false;
    setTicked(new Set());
  };
  return { ticked, read, clear };
}
