import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useEffect, useRef } from "react";
import { Form, Link } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { LimitKey } from "#app/engine/rules/limits.ts";
import { quantityText } from "#app/lib/form-values.ts";
import { limitText } from "#app/lib/limit-quantity.ts";
import type { LimitGroup, LimitRow } from "#app/lib/limit-rows.ts";
import { groupTitle } from "./LimitsTable.tsx";

/** A limit as it stood when the form was filled; sent along, so that only what the person changed is saved. */
interface Opened {
  version: number;
  value: number;
  source: string;
}

type LimitText = { value: string; source: string; opened: { version: string; value: string; source: string } };
type LimitsFormValues = Record<LimitKey, LimitText>;

interface Props {
  group: LimitGroup;
  lastResult: SubmissionResult<string[]> | null | undefined;
  /** what stands now of the limits that somebody else has changed meanwhile */
  opened: Partial<Record<LimitKey, Opened>>;
}

const textOf = ({ value, source, version, dimension, unit }: LimitRow): LimitText => ({
  value: quantityText(value, dimension, unit),
  source,
  opened: { version: String(version), value: String(value), source },
});

/** The limits of one rule to be changed together, so that those which depend on each other can be. */
export function LimitsForm({ group, lastResult, opened }: Props) {
  const { rule, limits } = group;
  const [form, fields] = useRecordForm<LimitsFormValues>({
    lastResult,
    defaultValue: Object.fromEntries(limits.map((limit) => [limit.key, textOf(limit)])),
  });
  // The link that led here is gone with the table that it stood above: the reader goes on from the heading.
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  return (
    <Form method="post" {...getFormProps(form)} className="p-4 tablet:p-6" aria-labelledby={`rule-${rule}`}>
      <h2 id={`rule-${rule}`} ref={heading} tabIndex={-1} className="text-lead font-semibold">
        {groupTitle(group)}
      </h2>
      <div className="mt-3">
        <FormHead lastResult={lastResult} />
      </div>
      {limits.map((limit) => {
        const parts = fields[limit.key].getFieldset();
        const sent = parts.opened.getFieldset();
        const now = opened[limit.key];
        return (
          <fieldset key={limit.key} className="border-t border-line py-3 first-of-type:border-0">
            <legend className="float-left mb-2 w-full font-semibold">{limit.title}</legend>
            <div className="clear-both grid gap-3 tablet:grid-cols-[1fr_2fr_1fr]">
              <QuantityField field={parts.value} label="Value" dimension={limit.dimension} />
              <LineField field={parts.source} label="Source" />
              <p className="text-quiet tablet:pt-6">Delivered: {limitText(limit.delivered.value, limit)}</p>
            </div>
            {(["version", "value", "source"] as const).map((part) => (
              <input
                key={part}
                type="hidden"
                name={sent[part].name}
                value={now ? String(now[part]) : (sent[part].initialValue ?? "")}
              />
            ))}
          </fieldset>
        );
      })}
      <div className="flex flex-wrap gap-2 border-t border-line pt-4">
        <SubmitButton busy="Saving">Save limits</SubmitButton>
        <Link to={`/carriers/limits#rule-${rule}`} className="btn">
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}
