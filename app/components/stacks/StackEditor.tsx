import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useCallback, useDeferredValue, useState } from "react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { StackAround } from "#app/lib/stack-around.ts";
import type { DraftFault } from "#app/lib/stack-draft.ts";
import { panelRequests, type StackPanel } from "#app/lib/stack-panel.ts";
import { saysTheSame, stackText, type StackText } from "#app/lib/stack-text.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import { insertion, LayerList } from "./LayerList.tsx";
import type { Status } from "./PanelStatus.tsx";
import { SourceFields } from "./SourceFields.tsx";
import { StackAnswer } from "./StackAnswer.tsx";
import type { CutPartOf } from "./stack-cut-layers.ts";
import { StackCut } from "./StackCut.tsx";
import { StackFindings } from "./StackFindings.tsx";
import { StackHeadFields } from "./StackHeadFields.tsx";
import { StackPanes } from "./StackPanes.tsx";
import { UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { useLiveEstimate } from "./use-live-estimate.ts";
import { useStackDraft } from "./use-stack-draft.ts";
import { useSelectedLayer } from "./use-selected-layer.ts";
import { ViewOptions } from "./ViewOptions.tsx";

/** Id of the form, so that buttons elsewhere on the page can send it. */
export const STACK_FORM = "stack";

interface Props extends StackAround {
  text: StackText;
  panel: StackPanel | null;
  /** null for a new stack */
  version: number | null;
  /** where a new stack may go; null for a stored one */
  programs: readonly { id: string; name: string }[] | null;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

/** A stack being built, with what follows from it beside it, live. */
export function StackEditor(props: Props) {
  const { text, version, programs, lastResult, choices, limits, view, overlay, others } = props;
  const [form, fields] = useRecordForm<StackText>({ id: STACK_FORM, lastResult, defaultValue: text });
  const typed = stackText(form.value);
  const draft = useStackDraft(JSON.stringify(typed), choices);
  const [at, setAt] = useState(view.at);
  const { temperature, read } = viewTemperature(at);
  const live = useLiveEstimate(panelRequests(draft, temperature), props.panel, limits);
  // The field comes first, then the drawings, which take longer and can wait for the next key.
  const [drawn, panel] = [useDeferredValue(draft), useDeferredValue(live.panel)];
  const focusPart = useCallback((part: CutPartOf) => {
    focusField(part === "silicon" ? "siliconThickness.value" : `layers[${part}].film`);
  }, []);
  const layers = fields.layers.getFieldList();
  const { part, select } = useSelectedLayer(
    layers.map(({ key }) => key ?? ""),
    focusPart,
  );
  const goTo = ({ field }: DraftFault) => {
    const index = /^layers\[(\d+)\]/.exec(field)?.[1];
    if (index !== undefined) select(Number(index));
    // The layer opens with the next paint; a field in a folded part can't take the focus before.
    requestAnimationFrame(() => focusField(field));
  };
  return (
    <Form method="post" {...getFormProps(form)}>
      <UnsavedGuard dirty={!saysTheSame(typed, text)} />
      <FormHead lastResult={lastResult} />
      {version !== null && <input type="hidden" name="version" value={version} />}
      {programs === null && <input type="hidden" name="program" value={text.program} />}
      <StackPanes
        build={
          <>
            <StackHeadFields fields={fields} programs={programs} silicon={choices.silicon} draft={draft} />
            <div className="@container border-b border-line">
              <div className="grid grid-cols-[minmax(0,1fr)] @min-[700px]:grid-cols-[464px_minmax(0,1fr)]">
                <div className="p-4 tablet:px-0">
                  <StackCut
                    draft={drawn}
                    panel={panel}
                    limits={limits}
                    edit={{
                      selected: part,
                      hrefFor: (of) => (of === "silicon" ? `#${fieldId("siliconThickness.value")}` : `#layer-${of}`),
                      onSelect: (of) => {
                        select(of);
                        if (of === "silicon") focusPart(of);
                      },
                      onAdd: (side) => form.insert(insertion(fields.layers.name, side, layers.length)),
                    }}
                  />
                </div>
                <div className="border-line @max-[700px]:border-t @min-[700px]:border-l">
                  <LayerList
                    form={form}
                    field={fields.layers}
                    draft={draft}
                    films={choices.films}
                    selected={part === "silicon" ? null : part}
                    onSelect={select}
                  />
                </div>
              </div>
            </div>
            <details className="px-4 py-3 tablet:px-5" open={fields.note.errors ? true : undefined}>
              <summary className="link w-fit cursor-pointer text-label">
                Note, and source of the silicon thickness
              </summary>
              <div className="mt-2 grid gap-3 tablet:grid-cols-2">
                <SourceFields parts={fields.siliconThickness.getFieldset()} of="silicon thickness" />
                <div className="col-span-full">
                  <NoteField field={fields.note} label="Note" />
                </div>
              </div>
            </details>
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
            options={
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
            }
          />
        }
      />
    </Form>
  );
}

/** The id that conform gives a field of this form. */
const fieldId = (name: string) => `${STACK_FORM}-${name}`;

function focusField(name: string) {
  const field = document.getElementById(fieldId(name));
  const folded = field?.closest("details");
  if (folded) folded.open = true;
  field?.focus();
}

function statusOf(
  faults: readonly DraftFault[],
  live: ReturnType<typeof useLiveEstimate>,
  goTo: (fault: DraftFault) => void,
): Status {
  const [first] = faults;
  if (first)
    return {
      kind: "waiting",
      what: first.what,
      more: faults.length - 1,
      fieldId: fieldId(first.field),
      goTo: () => goTo(first),
    };
  if (live.problem) return { kind: "problem", ...live.problem };
  return live.stale ? { kind: "asking" } : { kind: "current" };
}
