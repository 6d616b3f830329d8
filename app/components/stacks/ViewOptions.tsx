import { memo, useState, type KeyboardEvent } from "react";
import { useSearchParams } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { StackView } from "#app/lib/stack-view.ts";
import { Understood } from "#app/components/units/Understood.tsx";

interface Props {
  view: StackView;
  /** stacks that may be laid over this one */
  others: readonly { id: string; name: string; program: string }[];
  /** what was understood of the temperature, or what is wrong with it, as it is typed */
  typed: { at: string; understood: string | undefined; fault: string | undefined; onType: (at: string) => void };
}

/** A list of stacks may be long, and a key typed into a film says nothing of it. */
export const ViewOptions = memo(
  Options,
  ({ typed: before, ...one }, { typed: after, ...other }) =>
    one.view === other.view &&
    one.others === other.others &&
    before.at === after.at &&
    before.understood === after.understood &&
    before.fault === after.fault,
);

/** At which other temperature the shape is asked, and which other stack is laid over: both in the address. */
function Options({ view, others, typed }: Props) {
  const [, setSearch] = useSearchParams();
  const [laidOver, setLaidOver] = useState({ value: view.with, of: view.with });
  if (laidOver.of !== view.with) setLaidOver({ value: view.with, of: view.with });
  // Both are said each time: the second of two quick changes must not lose the first.
  const show = (at: string, other: string) =>
    setSearch(
      (search) => {
        for (const [name, value] of [
          ["at", at.trim()],
          ["with", other],
        ] as const)
          if (value === "") search.delete(name);
          else search.set(name, value);
        return search;
      },
      { replace: true, preventScrollReset: true },
    );
  const commit = (at: string) => {
    if (at.trim() !== view.at) show(at, laidOver.value);
  };
  // Enter would save the stack, which is not what a look at another temperature asks for.
  const onEnter = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key !== "Enter") return;
    event.preventDefault();
    commit(event.currentTarget.value);
  };
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
      <TextField
        name="at"
        label="Shape also at"
        className="w-36"
        defaultValue={view.at}
        placeholder="245 °C"
        hint={
          typed.understood ? (
            <Understood text={typed.understood} dimension="temperature" />
          ) : (
            <>25&nbsp;°C is always shown</>
          )
        }
        error={typed.fault}
        autoComplete="off"
        onInput={(event) => typed.onType(event.currentTarget.value)}
        onBlur={(event) => commit(event.currentTarget.value)}
        onKeyDown={onEnter}
      />
      <SelectField
        name="with"
        label="Lay over"
        className="min-w-0 flex-1 basis-56"
        value={laidOver.value}
        blank="No other stack"
        options={others.map(({ id, name, program }) => ({ value: id, label: `${name} (${program})` }))}
        error={view.withFault ?? undefined}
        onChange={(event) => {
          setLaidOver({ value: event.currentTarget.value, of: view.with });
          show(typed.at, event.currentTarget.value);
        }}
      />
    </div>
  );
}
