import { Fragment, type HTMLAttributes, type ReactNode } from "react";
import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { StepRow } from "#app/lib/flow-rows.ts";
import { StepIcon } from "./StepIcon.tsx";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

export interface StepTableProps {
  caption: string;
  rows: readonly StepRow[];
  /** where a step's name leads; without it the rows only tell */
  href?: (row: StepRow) => string;
  /** id of the row that the person has just worked on */
  current?: string | null;
  /** what can be done to a row */
  actions?: (row: StepRow) => ReactNode;
  /** on a phone: where it leads to open a row to its actions, or to close it again */
  more?: (row: StepRow) => string;
  /** rows are moved by a handle: its events, the step that is being moved, and the index of the row that it would go before */
  drag?: { handle: (id: string) => HTMLAttributes<HTMLElement>; id: string | null; before: number | null };
  /** what is said or asked beneath a row */
  below?: (row: StepRow) => ReactNode;
}

/** The steps of a flow, one a row; on a phone a row becomes a block. */
export function StepTable({ caption, rows, href, current, actions, more, drag, below }: StepTableProps) {
  const columns = actions ? 9 : 8;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead className="max-tablet:sr-only">
          <tr>
            <th scope="col" className="num">
              Step
            </th>
            <th scope="col">What is done</th>
            <th scope="col" className="max-tablet:hidden">
              Adds or removes
            </th>
            <th scope="col" className="num max-tablet:hidden">
              Peak
              <span className="block">
                <OwnHead unit="°C" />
              </span>
            </th>
            <th scope="col" className="num max-tablet:hidden">
              Silicon after
              <span className="block">
                <OwnHead unit="µm" />
              </span>
            </th>
            <th scope="col" className="max-wide:hidden">
              Tool
            </th>
            <th scope="col" className="max-wide:hidden">
              Exposed to
            </th>
            <th scope="col" className="max-tablet:hidden">
              Held by
            </th>
            {actions && (
              <th scope="col" className="screen-only max-tablet:hidden">
                <span className="sr-only">Change the order</span>
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => {
            const beneath = below?.(row);
            return (
              <Fragment key={row.id}>
                <Row
                  row={row}
                  href={href}
                  current={row.id === current}
                  actions={actions}
                  more={more?.(row)}
                  handle={drag?.handle(row.id)}
                  look={drag ? lookOf(drag, row, index, rows.length) : ""}
                />
                {actions && row.id === current && (
                  <tr className="tablet:hidden">
                    <td colSpan={columns} className="border-t-0 bg-wash pl-10">
                      {actions(row)}
                    </td>
                  </tr>
                )}
                {beneath && (
                  <tr>
                    <td colSpan={columns} className="border-t-0 bg-wash tablet:pl-17">
                      {beneath}
                    </td>
                  </tr>
                )}
              </Fragment>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

/** A row while one is being moved: the one that moves is pale, a line shows where it would go. */
function lookOf(
  { id, before }: NonNullable<StepTableProps["drag"]>,
  row: StepRow,
  index: number,
  rows: number,
): string {
  if (row.id === id) return "opacity-50";
  if (before === index) return "[&>*]:border-t-3 [&>*]:border-t-copper!";
  if (before === rows && index === rows - 1) return "[&>*]:border-b-3 [&>*]:border-b-copper!";
  return "";
}

interface RowProps extends Pick<StepTableProps, "href" | "actions"> {
  row: StepRow;
  current: boolean;
  more: string | undefined;
  handle: HTMLAttributes<HTMLElement> | undefined;
  look: string;
}

function Row({ row, href, current, actions, more, handle, look }: RowProps) {
  const { number, title, kind, slots, changes, peak, minutes, silicon, tool, run, sideUp, exposures, planned, bond } =
    row;
  const assumedWords = row.assumed && <span className="font-semibold text-caution"> assumed numbers</span>;
  const toolWords = tool ?? <span className="font-semibold text-caution">No tool chosen</span>;
  return (
    <tr id={`step-${row.id}`} aria-current={current ? "true" : undefined} className={look}>
      <td className="num w-10 align-top font-semibold whitespace-nowrap tablet:w-15">
        {handle && (
          // For the pointer only: the buttons of the row do the same for everybody.
          <span
            {...handle}
            className="screen-only -my-1.5 mr-1 -ml-2 inline-flex h-8 w-6 cursor-grab touch-none items-center justify-center align-middle text-quiet select-none active:cursor-grabbing max-tablet:hidden"
            title="Drag to move"
            aria-hidden
          >
            <StepIcon kind="drag" />
          </span>
        )}
        {number}
      </td>
      <th scope="row" className="align-top font-normal max-tablet:relative max-tablet:pr-12 wide:min-w-72">
        {href ? (
          <Link to={href(row)} className="link">
            {noBreak(title)}
          </Link>
        ) : (
          noBreak(title)
        )}
        <span className="block text-label text-quiet max-tablet:hidden">
          {kind}
          {slots && `, ${slots}`}
          <span className="wide:hidden">
            , {toolWords}
            {run && `, ${run}`}
          </span>
          {exposures.length > 0 && <span className="wide:hidden">, {exposures.join(", ")}</span>}
          {assumedWords}
        </span>
        <div className="tablet:hidden">
          <p className="text-label text-quiet">
            {slots && `${slots}: `}
            {silicon.text}&nbsp;µm, <OwnFigure unit="°C">{peak}</OwnFigure>&nbsp;
            <OwnHead unit="°C" />
            {minutes && `, ${minutes}`}, {planned}
            {bond && `: ${noBreak(bond)}`}
            {tool === null && <>, {toolWords}</>}
            {run && `, ${run}`}
            {sideUp && `, ${sideUp} up`}
            {assumedWords}
          </p>
          <Changes changes={changes} />
          {more && (
            <Link
              to={more}
              preventScrollReset
              className="absolute top-0 right-0 flex size-11 items-center justify-center text-ink"
              aria-label={`Change step ${number}`}
              aria-expanded={current}
            >
              <StepIcon kind="more" />
            </Link>
          )}
        </div>
      </th>
      <td className="align-top max-tablet:hidden">
        <Changes changes={changes} />
      </td>
      <td className="num align-top max-tablet:hidden">
        <OwnFigure unit="°C">{peak}</OwnFigure>
        {minutes && <span className="block text-label text-quiet">{minutes}</span>}
        {row.profiled && <span className="block text-label text-quiet">profile</span>}
      </td>
      <td className={`num align-top max-tablet:hidden ${silicon.changed ? "font-semibold" : "text-quiet"}`}>
        <OwnFigure unit="µm">{silicon.text}</OwnFigure>
      </td>
      <td className="align-top max-wide:hidden">
        {toolWords}
        {run && <span className="block text-label text-quiet">{run}</span>}
      </td>
      <td className="align-top text-quiet max-wide:hidden">{exposures.join(", ")}</td>
      <td className="align-top max-tablet:hidden">
        <span className="whitespace-nowrap">{planned}</span>
        {bond && <span className="block text-label text-quiet">{noBreak(bond)}</span>}
        {sideUp && <span className="block text-label text-quiet">{sideUp} up</span>}
      </td>
      {actions && <td className="screen-only align-top max-tablet:hidden tablet:pr-4">{actions(row)}</td>}
    </tr>
  );
}

function Changes({ changes }: Pick<StepRow, "changes">) {
  if (changes.length === 0) return null;
  return (
    <ul>
      {changes.map(({ word, what, side }, index) => (
        <li key={index} className="text-label">
          <span className="text-quiet">{word}</span> {noBreak(what)}
          {side === "back side" && <span className="text-quiet">, back side</span>}
        </li>
      ))}
    </ul>
  );
}
