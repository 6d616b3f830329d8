/** The fields of a title block after ISO 7200:2004. Text as printed; what is not known yet says so, such as 'not yet'. */
export interface TitleBlockFields {
  owner: string;
  documentType: string;
  title: string;
  prepared: string;
  checked: string;
  released: string;
  number: string;
  revision: string;
  status: string;
  /** Date of issue. */
  date: string;
  language: string;
  /** Such as '1 of 2'. */
  page: string;
}

export interface TitleBlockProps {
  fields: TitleBlockFields;
  /** screen: five rows, 384 to 420 px wide. paper: four rows, 112 mm wide, without the language. */
  variant?: "screen" | "paper";
  /** Its name where a page has several. */
  label?: string;
}

const CELLS: readonly [area: string, label: string, field: keyof TitleBlockFields, weight?: "title" | "strong"][] = [
  ["owner", "Legal owner", "owner"],
  ["type", "Document type", "documentType"],
  ["title", "Title", "title", "title"],
  ["prepared", "Prepared by", "prepared"],
  ["checked", "Checked by", "checked"],
  ["released", "Released by", "released"],
  ["number", "Number", "number", "strong"],
  ["revision", "Revision", "revision", "strong"],
  ["status", "Status", "status", "strong"],
  ["date", "Date of issue", "date"],
  ["language", "Language", "language"],
  ["page", "Page", "page"],
];

/** The title block in the lower right corner of an assessment or a sheet; it shares the lines of the frame around it. */
export function TitleBlock({ fields, variant = "screen", label = "Title block" }: TitleBlockProps) {
  const paper = variant === "paper";
  const cells = paper ? CELLS.filter(([area]) => area !== "language") : CELLS;
  return (
    <section className={`title-block${paper ? " title-block-paper" : ""}`} aria-label={label}>
      <dl>
        {cells.map(([area, label, field, weight]) => (
          <div key={area} style={{ gridArea: area }}>
            <dt>{label}</dt>
            <dd className={weight}>{fields[field]}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
