import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { lazy, Suspense, useCallback, useDeferredValue, useMemo, useState } from "react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { PlainInput } from "#app/components/forms/PlainInput.tsx";
import { UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { KeptDraft } from "#app/lib/drafts.ts";
import type { StackAround } from "#app/lib/stack-around.ts";
import type { StackConflict as Conflict } from "#app/lib/stack-conflict.ts";
import type { DraftFault } from "#app/lib/stack-draft.ts";
import type { Direction } from "#app/lib/undo-key.ts";
import { panelRequests, type StackPanel } from "#app/lib/stack-panel.ts";
import { filmOf } from "#app/lib/stack-put-back.ts";
import { stackText, type StackText } from "#app/lib/stack-text.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import { putInto } from "./put-into.ts";
import { statusOf } from "./status-of.ts";
import { StackAnswer } from "./StackAnswer.tsx";
import { StackBuild } from "./StackBuild.tsx";
import { StackFindings } from "./StackFindings.tsx";
import { focusField, STACK_FORM } from "./stack-fields.ts";
import { StackPanes } from "./StackPanes.tsx";
import { StackToolBar } from "./StackToolBar.tsx";
import type { CutPartOf } from "./stack-cut-layers.ts";
import { NEW, useKeptDraft } from "./use-kept-draft.ts";
import { useSaveOnceSaid } from "./use-save-once-said.ts";
import { useDrawn } from "./use-drawn.ts";
import { useLayerEdits } from "./use-layer-edits.ts";
import { useLiveEstimate } from "./use-live-estimate.ts";
import { useSelectedLayer } from "./use-selected-layer.ts";
import { useStackDraft } from "./use-stack-draft.ts";
import { useStackHistory } from "./use-stack-history.ts";
import { isText, useUndoKeys } from "./use-undo-keys.ts";
import { ViewOptions } from "./ViewOptions.tsx";

// What few visits need comes when it is needed.
const StackConflict = lazy(() => import("./StackConflict.tsx").then((module) => ({ default: module.StackConflict })));
const DraftOffer = lazy(() => import("./DraftOffer.tsx").then((module) => ({ default: module.DraftOffer })));
const FilmDialog = lazy(() => import("./FilmDialog.tsx").then((module) => ({ default: module.FilmDialog })));
const differences = () => import("#app/lib/stack-differences.ts");

interface Props extends StackAround {
  /** id of the stack; null for a new one */
  stackId: string | null;
  text: StackText;
  panel: StackPanel | null;
  /** null for a new stack */
  version: number | null;
  /** where a new stack may go; null for a stored one */
  programs: readonly { id: string; name: string }[] | null;
  /** id of who edits, so that what is kept in this browser is told apart */
  person: string;
  lastResult: SubmissionResult<string[]> | null | undefined;
  conflict: Conflict | null | undefined;
  /** whether it has just been saved */
  saved: boolean;
}

const textOf = (said: string) => stackText(JSON.parse(said));

/** A stack being built, with what follows from it beside it, live. */
export function StackEditor(props: Props) {
  const { stackId, programs, lastResult, choices, limits, view, overlay, others, person, saved } = props;
  // What is typed belongs to the stack as it was opened, whatever the page's data say later.
  const [basis, setBasis] = useState({ text: props.text, version: props.version });
  const [settled, setSettled] = useState<Conflict | null>(null);
  const conflict = props.conflict && props.conflict !== settled ? props.conflict : null;
  const [form, fields] = useRecordForm<StackText>({ id: STACK_FORM, lastResult, defaultValue: basis.text });
  const typed = stackText(form.value);
  const said = JSON.stringify(typed);
  const opened = useMemo(() => JSON.stringify(stackText(basis.text)), [basis]);
  const history = useStackHistory(said);
  const draft = useStackDraft(said, choices, history.typing);
  const kept = useKeptDraft({ person, record: stackId ?? NEW, version: basis.version, opened, said, saved });
  const [words, setWords] = useState("");
  const [filmFor, setFilmFor] = useState<number | null>(null);
  const [at, setAt] = useState(view.at);
  const { temperature, read } = useMemo(() => viewTemperature(at), [at]);
  const requests = useMemo(() => panelRequests(draft, temperature), [draft, temperature]);
  const live = useLiveEstimate(requests, props.panel, limits);
  const panel = useDeferredValue(live.panel);
  const focusPart = useCallback((part: CutPartOf) => {
    focusField(part === "silicon" ? "siliconThickness.value" : `layers[${part}].film`);
  }, []);
  const filmKeys = fields.layers.getFieldList().map(({ key }) => key ?? "");
  const drawn = useDrawn(draft, typed.layers.map(({ side }, index) => `${filmKeys[index] ?? ""} ${side}`).join());
  const selection = useSelectedLayer(filmKeys, focusPart);
  const edits = useLayerEdits({
    form,
    text: typed,
    names: draft.layers.map(({ name }) => name),
    select: selection.select,
    expect: selection.expect,
    settle: history.settle,
    announce: setWords,
    typeFilm: setFilmFor,
  });

  const onStep = (direction: Direction, focus: boolean) => {
    const to = history.take(direction);
    if (to === null) return;
    putInto(form, [typed, textOf(to)], selection, focus);
    const done = direction === "undo" ? "Taken back" : "Done again";
    void differences().then(({ stackDifferences, changeWords }) =>
      setWords(`${done}. ${changeWords(stackDifferences(typed, textOf(to), choices))}`),
    );
  };
  useUndoKeys((direction) => onStep(direction, true), history.unnoted);
  const replace = (by: StackText, on: typeof basis, what: string) => {
    history.settle();
    setBasis(on);
    putInto(form, [typed, stackText(by)], selection, true);
    setWords(what);
  };
  const saveOnceSaid = useSaveOnceSaid(said);
  const takeDraft = (found: KeptDraft) => {
    kept.settle(found);
    replace(textOf(found.said), { text: textOf(found.opened), version: found.version }, "The draft is taken up");
  };
  const takeTheirs = ({ by, theirs, version }: Conflict) => {
    setSettled(props.conflict ?? null);
    replace(theirs, { text: theirs, version }, `The stack is as ${by} saved it`);
  };
  const takeMerged = ({ by, theirs, version }: Conflict, merged: StackText, save: boolean) => {
    setSettled(props.conflict ?? null);
    replace(merged, { text: theirs, version }, `Yours and what ${by} saved are put together`);
    if (save) saveOnceSaid(JSON.stringify(stackText(merged)));
  };
  const goTo = ({ field }: DraftFault) => {
    const film = filmOf(field);
    if (film !== null) edits.select(film);
    requestAnimationFrame(() => focusField(field));
  };
  const inBrowser = useInBrowser();
  const options = useMemo(
    () => (
      <>
        <ViewOptions
          view={view}
          others={others}
          typed={{
            at,
            understood: read?.ok ? read.understood : undefined,
            fault: read && !read.ok ? read.message : undefined,
            onType: setAt,
          }}
        />
        <noscript>
          <button type="submit" name="intent" value="estimate" className="btn mb-3">
            Work it out without saving
          </button>
        </noscript>
      </>
    ),
    [view, others, at, setAt, read],
  );
  const [found] = lastResult ? [] : kept.offered;
  return (
    <>
      {filmFor !== null && (
        <Suspense>
          <FilmDialog
            thickness={typed.layers[filmFor]?.thickness.value ?? ""}
            onAdded={(film) => {
              setFilmFor(null);
              edits.putFilm(filmFor, film);
            }}
            onClose={() => setFilmFor(null)}
          />
        </Suspense>
      )}
      <Form
        method="post"
        {...getFormProps(form)}
        onInput={({ target }) => isText(target) && history.type()}
        onBlur={({ target }) => isText(target) && history.settle()}
      >
        <UnsavedGuard
          dirty={said !== opened}
          stands="What you changed here is not saved yet. This browser keeps it as a draft until you sign out."
        />
        <Suspense>
          {conflict ? (
            <StackConflict
              conflict={conflict}
              mine={typed}
              opened={conflict.version === basis.version ? null : basis.text}
              names={choices}
              address={`/stacks/${stackId ?? ""}`}
              onTakeTheirs={() => takeTheirs(conflict)}
              onMerge={(merged, save) => takeMerged(conflict, merged, save)}
            />
          ) : (
            <FormHead lastResult={lastResult === null || props.conflict ? null : lastResult} />
          )}
          {found && (
            <DraftOffer
              draft={found}
              version={basis.version}
              more={kept.offered.length - 1}
              onTake={() => takeDraft(found)}
              onForget={() => kept.settle(found)}
            />
          )}
        </Suspense>
        {basis.version !== null && (
          <PlainInput type="hidden" name="version" value={conflict?.version ?? basis.version} />
        )}
        {programs === null && <PlainInput type="hidden" name="program" value={basis.text.program} />}
        <StackPanes
          build={
            <>
              {inBrowser ? (
                <StackToolBar
                  ways={{ undo: history.undoTo !== null, redo: history.redoTo !== null }}
                  onStep={(direction) => onStep(direction, false)}
                  onMirror={draft.layers.some(({ side }) => side === "front") ? edits.mirrorAll : null}
                  keptAt={kept.keptAt}
                  said={words}
                />
              ) : (
                // Keeps its place until the scripts are there.
                <div className="min-h-16 border-b border-line scriptless:hidden" />
              )}
              <StackBuild
                form={form}
                fields={fields}
                stamp={JSON.stringify([form.key, form.initialValue, form.allErrors, filmKeys])}
                programs={programs}
                choices={choices}
                draft={draft}
                drawn={drawn}
                panel={panel}
                limits={limits}
                part={selection.part}
                focusPart={focusPart}
                edits={edits}
              />
            </>
          }
          answer={<StackAnswer panel={live.panel} limits={limits} status={statusOf(draft.faults, live, goTo)} />}
          findings={
            <StackFindings
              name={typed.name || "New stack"}
              draft={drawn}
              panel={panel}
              overlay={overlay}
              limits={limits}
              options={options}
            />
          }
        />
      </Form>
    </>
  );
}
