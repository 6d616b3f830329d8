import type { FieldMetadata, FormMetadata } from "@conform-to/react";
import { memo } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import type { DraftLayer, FilmChoice, StackDraft } from "#app/lib/stack-draft.ts";
import { newLayer, type LayerText, type StackText } from "#app/lib/stack-text.ts";
import { lengthWords } from "#app/lib/stack-words.ts";
import { LayerActions } from "./LayerActions.tsx";
import { LayerFields } from "./LayerFields.tsx";
import { shiftByKey } from "./shift-by-key.ts";
import type { LayerEdits } from "./use-layer-edits.ts";

interface Props {
  form: FormMetadata<StackText>;
  field: FieldMetadata<LayerText[]>;
  draft: StackDraft;
  films: readonly FilmChoice[];
  /** position in the list, null when the silicon is selected */
  selected: number | null;
  edits: LayerEdits;
}

/** Where a new film goes in the list, which runs from the top of the cut to its foot. */
export const insertion = (name: FieldMetadata<LayerText[]>["name"], side: Side, count: number) => ({
  name,
  index: side === "front" ? 0 : count,
  defaultValue: newLayer(side),
});

/**
 * All films as fields, top to bottom as the cut shows them. With scripts the selected one is open and the others are folded;
 * without them all are open.
 */
export function LayerList({ form, field, draft, films, selected, edits }: Props) {
  const list = field.getFieldList();
  const on = (side: Side) => list.flatMap((_, index) => (draft.layers[index]?.side === side ? [index] : []));
  const part = (index: number, among: number[]) => {
    const layer = list[index];
    return (
      layer && (
        <LayerPart
          key={layer.key}
          form={form}
          field={layer}
          place={{ index, count: list.length, first: index === among[0], last: index === among.at(-1) }}
          draft={draft.layers[index]}
          stamp={JSON.stringify([layer.key, layer.value, layer.allErrors, draft.layers[index]])}
          incomplete={draft.faults.some(({ field: name }) => name.startsWith(`layers[${index}].`))}
          films={films}
          selected={selected === index}
          edits={edits}
        />
      )
    );
  };
  const [front, back] = [on("front"), on("back")];
  return (
    <div>
      <SideHead id="device-side" words="Device side" />
      <AddButton form={form} insert={insertion(field.name, "front", list.length)} words="Add a film on top" />
      {front.map((index) => part(index, front))}
      <p className="border-t border-line px-4 py-2 text-quiet">Silicon</p>
      {back.map((index) => part(index, back))}
      <SideHead id="back-side" words="Back side" />
      <AddButton form={form} insert={insertion(field.name, "back", list.length)} words="Add a film below" />
    </div>
  );
}

function SideHead({ id, words }: { id: string; words: string }) {
  return (
    <h2 id={id} className="border-t border-line px-4 pt-3 font-semibold first:border-t-0">
      {words}
    </h2>
  );
}

interface AddProps {
  form: FormMetadata<StackText>;
  insert: ReturnType<typeof insertion>;
  words: string;
}

function AddButton({ form, insert, words }: AddProps) {
  return (
    <p className="px-4 pt-1 pb-3">
      <button {...form.insert.getButtonProps(insert)} className="link cursor-pointer">
        {words}
      </button>
    </p>
  );
}

interface PartProps {
  form: FormMetadata<StackText>;
  field: FieldMetadata<LayerText>;
  place: { index: number; count: number; first: boolean; last: boolean };
  draft: DraftLayer | undefined;
  /** the same while nothing of the film has changed, its errors included */
  stamp: string;
  /** whether something is missing or cannot be read */
  incomplete: boolean;
  films: readonly FilmChoice[];
  selected: boolean;
  edits: LayerEdits;
}

/** A key typed into one film leaves the fields of all others as they are: twenty films are hundreds of fields. */
const LayerPart = memo(
  LayerFold,
  (before, after) =>
    before.stamp === after.stamp &&
    before.films === after.films &&
    before.selected === after.selected &&
    before.incomplete === after.incomplete &&
    before.place.index === after.place.index &&
    before.place.count === after.place.count &&
    before.place.first === after.place.first &&
    before.place.last === after.place.last,
);

function LayerFold({ form, field, place, draft, incomplete, films, selected, edits }: PartProps) {
  const inBrowser = useInBrowser();
  const { index, count, first, last } = place;
  const name = draft?.name ?? `film ${index + 1}`;
  // What the server has refused stays open until it is mended.
  const shown = selected || (incomplete && Object.keys(field.allErrors).length > 0);
  return (
    <details
      id={`layer-${index}`}
      open={!inBrowser || shown}
      className="border-t border-line"
      onKeyDown={(event) => shiftByKey(event, (by) => edits.shift(index, by))}
    >
      <summary
        className={`flex min-h-10 cursor-pointer flex-wrap items-baseline gap-x-2 px-4 py-2 ${selected ? "bg-wash" : ""}`}
        onClick={(event) => {
          event.preventDefault();
          edits.select(index);
        }}
      >
        <span className={selected ? "font-semibold" : ""}>{draft?.film ? name : "Film not chosen"}</span>
        {draft !== undefined && draft.thickness !== null && (
          <span className="text-quiet">{lengthWords(draft.thickness)}</span>
        )}
        {incomplete && <span className="text-stop">needs a look</span>}
        <span className="ml-auto text-label text-quiet">
          {index + 1} of {count}
        </span>
      </summary>
      <fieldset className={`px-4 pt-1 pb-4 ${shown ? "" : "[@media(scripting:enabled)]:hidden"}`}>
        <legend className="sr-only">
          {name}, {index + 1} of {count} from the top
        </legend>
        <LayerFields field={field} draft={draft} films={films} onTypeFilm={() => edits.typeFilm(index)} />
        <LayerActions
          form={form}
          index={index}
          side={draft?.side ?? "front"}
          first={first}
          last={last}
          name={name}
          edits={edits}
        />
      </fieldset>
    </details>
  );
}
