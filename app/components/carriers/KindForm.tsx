import { createElement, type FunctionComponent } from "react";
import type { RecordFormProps } from "#app/components/library/RecordForm.tsx";
import type { KindRecord } from "#app/lib/kind-data.ts";
import type { KindSlug } from "#app/lib/library-kinds.ts";
import { BondingMaterialForm } from "./BondingMaterialForm.tsx";
import { CarrierForm } from "./CarrierForm.tsx";
import { SiliconForm } from "./SiliconForm.tsx";
import { TapeForm } from "./TapeForm.tsx";
import { ToolForm } from "./ToolForm.tsx";

const FORMS: { [Slug in KindSlug]: FunctionComponent<RecordFormProps<KindRecord<Slug>>> } = {
  carriers: CarrierForm,
  "bonding-materials": BondingMaterialForm,
  tapes: TapeForm,
  silicon: SiliconForm,
  tools: ToolForm,
};

export type KindFormProps<Slug extends KindSlug = KindSlug> = {
  [S in Slug]: { slug: S } & RecordFormProps<KindRecord<S>>;
}[Slug];

/** The form of a kind. */
export function KindForm<Slug extends KindSlug>({ slug, record, version, lastResult, back }: KindFormProps<Slug>) {
  const form: FunctionComponent<RecordFormProps<KindRecord<Slug>>> = FORMS[slug];
  return createElement(form, { record, version, lastResult, back });
}
