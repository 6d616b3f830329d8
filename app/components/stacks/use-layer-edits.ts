import type { FieldName, FormMetadata } from "@conform-to/react";
import { useEffect, useState } from "react";
import { copyPlace, crossed, mirroredDeviceSide, mirrorPlace, moved, otherSide } from "#app/lib/stack-edit.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import type { LayerText, StackText } from "#app/lib/stack-text.ts";
import { LAYERS } from "./stack-fields.ts";
import type { CutPartOf } from "./stack-cut-layers.ts";

/** What can be done to the films of a stack; the same object from render to render. */
export interface LayerEdits {
  select: (part: CutPartOf) => void;
  /** one place up or down on its side; false where it is the last there */
  shift: (index: number, by: 1 | -1) => boolean;
  /** before the film that has that index now, on that side */
  place: (index: number, to: { before: number; side: Side }) => void;
  copy: (index: number) => void;
  remove: (index: number) => void;
  mirror: (index: number) => void;
  cross: (index: number) => void;
  mirrorAll: () => void;
  /** asks for a film that the library lacks */
  typeFilm: (index: number) => void;
  /** puts a film that the library has now, and its thickness as it was typed, into that place */
  putFilm: (index: number, film: { id: string; name: string; thickness: string }) => void;
}

interface Hold {
  form: FormMetadata<StackText>;
  text: StackText;
  /** of the films, in words */
  names: readonly string[];
  select: (part: CutPartOf) => void;
  expect: (index: number) => void;
  typeFilm: (index: number) => void;
  /** is told before anything is done */
  settle: () => void;
  /** what was done, for who does not see it */
  announce: (words: string) => void;
}

/** Whatever had the focus keeps it where it has moved along; where it went with its film, the film at `index` takes it. */
function keepFocus(index: number) {
  const held = document.activeElement;
  requestAnimationFrame(() => {
    if (held instanceof HTMLElement && document.activeElement !== held) held.focus();
    const { activeElement: has } = document;
    if (has === null || has === document.body || has.matches(":disabled") || !shown(has))
      document.querySelector<HTMLElement>(`#layer-${index} > summary`)?.focus();
  });
}

const shown = (element: Element) => element.getClientRects().length > 0;

const sideWords = (side: Side) => (side === "front" ? "device side" : "back side");

/** The films of the form as a whole: moved, copied and mirrored, each as one change that can be taken back. */
export function useLayerEdits(hold: Hold): LayerEdits {
  const [{ edits, follow }] = useState(() => layerEdits(hold));
  useEffect(() => follow(hold));
  return edits;
}

/** The edits, which act on what they were told of last. */
function layerEdits(first: Hold): { edits: LayerEdits; follow: (hold: Hold) => void } {
  let hold = first;
  const now = () => hold;
  const nameOf = (index: number) => now().names[index] ?? "Film";
  const put = (layers: LayerText[], selected: number) => {
    now().expect(selected);
    now().form.update({ name: LAYERS, value: layers });
    keepFocus(selected);
  };
  const insert = (index: number, layer: LayerText) => {
    now().expect(index);
    now().form.insert({ name: LAYERS, index, defaultValue: layer });
    keepFocus(index);
  };
  const place = (from: number, to: { before: number; side: Side }) => {
    const { text, form, settle, announce, select } = now();
    const film = text.layers[from];
    if (!film) return;
    const { films, index } = moved(text.layers, from, to);
    if (index === from && film.side === to.side) return;
    settle();
    select(from);
    if (film.side === to.side) {
      form.reorder({ name: LAYERS, from, to: index });
      keepFocus(index);
    } else put(films, index);
    announce(`${nameOf(from)} is ${index + 1} of ${films.length} from the top, ${sideWords(to.side)}`);
  };
  const edits: LayerEdits = {
    select: (part) => now().select(part),
    place,
    shift: (index, by) => {
      const { layers } = now().text;
      const side = layers[index]?.side;
      if (side === undefined || layers[index + by]?.side !== side) {
        const end = by < 0 ? "highest" : "lowest";
        if (side) now().announce(`${nameOf(index)} is the ${end} film of the ${sideWords(side)}`);
        return false;
      }
      place(index, { before: by < 0 ? index - 1 : index + 2, side });
      return true;
    },
    copy: (index) => {
      const { text, settle, announce } = now();
      const film = text.layers[index];
      if (!film) return;
      settle();
      insert(copyPlace(text.layers, index), film);
      announce(`${nameOf(index)} is there twice`);
    },
    remove: (index) => {
      const { form, settle, announce } = now();
      settle();
      form.remove({ name: LAYERS, index });
      announce(`${nameOf(index)} is taken out; undo brings it back`);
    },
    mirror: (index) => {
      const { text, settle, announce } = now();
      const film = text.layers[index];
      if (!film) return;
      settle();
      const side = otherSide(film.side);
      insert(mirrorPlace(text.layers, index), { ...film, side });
      announce(`${nameOf(index)} is on the ${sideWords(side)} too`);
    },
    cross: (index) => {
      const { text, settle, announce } = now();
      const film = text.layers[index];
      if (!film) return;
      settle();
      const { films, index: to } = crossed(text.layers, index);
      put(films, to);
      announce(`${nameOf(index)} is on the ${sideWords(otherSide(film.side))} now`);
    },
    typeFilm: (index) => now().typeFilm(index),
    putFilm: (index, { id, name, thickness }) => {
      const { text, form, settle, expect, announce } = now();
      const layer = text.layers[index];
      if (!layer) return;
      settle();
      expect(index);
      const typed = { ...layer.thickness, value: thickness };
      form.update({
        name: `layers[${index}]` as FieldName<LayerText>,
        value: { ...layer, film: id, thickness: typed },
      });
      announce(`${name} is in the library and in the stack`);
      keepFocus(index);
    },
    mirrorAll: () => {
      const { text, settle, announce } = now();
      const replaced = text.layers.filter(({ side }) => side === "back").length;
      const films = mirroredDeviceSide(text.layers);
      settle();
      put(films, 0);
      const was = replaced === 0 ? "" : `, in place of ${replaced === 1 ? "one film" : `${replaced} films`}`;
      announce(`The back side mirrors the device side${was}`);
    },
  };
  return { edits, follow: (next) => void (hold = next) };
}
