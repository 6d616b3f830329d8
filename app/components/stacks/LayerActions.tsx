import type { FormMetadata } from "@conform-to/react";
import type { MouseEvent } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import type { LayerEdits } from "./use-layer-edits.ts";

interface Props {
  form: FormMetadata<StackText>;
  index: number;
  side: Side;
  /** whether it is the first or the last of its side */
  first: boolean;
  last: boolean;
  /** of the film */
  name: string;
  edits: LayerEdits;
}

/** What can be done to a film as a whole. Moving and removing work without scripts too. */
export function LayerActions({ form, index, side, first, last, name, edits }: Props) {
  const inBrowser = useInBrowser();
  const there = side === "front" ? "back side" : "device side";
  const inPlace = (act: () => void) => (event: MouseEvent) => {
    event.preventDefault();
    act();
  };
  const move = (by: 1 | -1) => ({
    ...form.reorder.getButtonProps({ name: "layers", from: index, to: index + by }),
    onClick: inPlace(() => edits.shift(index, by)),
    className: "btn",
  });
  return (
    <div className="screen-only mt-4">
      <div className="grid grid-cols-2 gap-2">
        <button {...move(-1)} disabled={first} aria-label={`Move up: ${name}`}>
          Move up
        </button>
        <button {...move(1)} disabled={last} aria-label={`Move down: ${name}`}>
          Move down
        </button>
        {inBrowser && (
          <>
            <button type="button" className="btn" onClick={() => edits.copy(index)} aria-label={`Duplicate: ${name}`}>
              Duplicate
            </button>
            <button
              type="button"
              className="btn"
              onClick={() => edits.mirror(index)}
              aria-label={`Mirror to the ${there}: ${name}`}
            >
              Mirror
            </button>
            <button
              type="button"
              className="btn col-span-2"
              onClick={() => edits.cross(index)}
              aria-label={`Move to the ${there}: ${name}`}
            >
              Move to the {there}
            </button>
          </>
        )}
        <button
          {...form.remove.getButtonProps({ name: "layers", index })}
          onClick={inPlace(() => edits.remove(index))}
          className="btn btn-remove col-span-2"
          aria-label={`Remove film: ${name}`}
        >
          Remove film
        </button>
      </div>
      {inBrowser && (
        <p className="mt-2 text-label text-quiet">
          Mirror puts a copy on the {there}, as far from the silicon. Alt with an arrow key moves the film.
        </p>
      )}
    </div>
  );
}
