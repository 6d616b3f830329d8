import { useState } from "react";

/** Name under which what is ticked is sent. */
export const TICKED = "of";

export interface Ticks {
  /** id of the form that the boxes belong to */
  form: string;
  /** what is ticked, on other pages of the list as well */
  ids: ReadonlySet<string>;
  /** asks the boxes on the page, after one was ticked or before the first was */
  read: (form: HTMLFormElement | null) => void;
  /** ticks or unticks every box on the page */
  onPage: (form: HTMLFormElement | null, checked: boolean) => void;
  clear: (form: HTMLFormElement | null) => void;
}

const boxesOf = (form: HTMLFormElement | null) =>
  [...(form?.elements ?? [])].filter(
    (each): each is HTMLInputElement =>
      each instanceof HTMLInputElement && each.name === TICKED && each.type === "checkbox",
  );

/**
 * What is ticked in a list; it outlasts a turn of the list's page. The boxes themselves are asked, so that what was ticked before the
 * scripts came counts as well.
 * @param form id of the form that the boxes belong to, one of the page's own
 */
export function useTicked(form: string): Ticks {
  const [ids, setIds] = useState<ReadonlySet<string>>(new Set());
  const read = (element: HTMLFormElement | null) => {
    const boxes = boxesOf(element);
    if (boxes.length === 0) return;
    setIds((before) => {
      const next = new Set(before);
      for (const { value, checked } of boxes)
        if (checked) next.add(value);
        else next.delete(value);
      return next;
    });
  };
  return {
    form,
    ids,
    read,
    onPage: (element, checked) => {
      for (const box of boxesOf(element)) box.checked = checked;
      read(element);
    },
    clear: (element) => {
      for (const box of boxesOf(element)) box.checked = false;
      setIds(new Set());
    },
  };
}
