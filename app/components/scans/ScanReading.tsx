import { fileSize } from "#app/lib/file-size.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { FileReading, ScanParameters } from "#app/schemas/scan-result.ts";
import type { ScanFileView } from "#app/schemas/scan-view.ts";
import { DELIMITER_WORDS } from "#app/lib/scan-reading/delimiter-words.ts";

interface Props {
  which: "before" | "after";
  file: ScanFileView;
  reading: FileReading;
  parameters: ScanParameters;
  /** points that are kept of the curves */
  drawn: number;
}

/** How one file was read, what of it could not be, and the file itself. */
export function ScanReading({ which, file, reading, parameters, drawn }: Props) {
  const { rows, used, columns, heading, delimiter, skipped, skippedInAll, averagedTo } = reading;
  const { decimalMark, positionUnit, heightUnit } = reading.format ?? parameters;
  const [position, height] = reading.readColumns ?? [0, 1];
  const mm = (metres: number) => formatQuantity(metres, "length", { unit: "mm" });
  return (
    <section aria-labelledby={`file-${which}`}>
      <h2 id={`file-${which}`} className="font-semibold">
        File {which} the film
      </h2>
      <p className="mt-1 wrap-anywhere">
        <a href={`/scans/files/${file.id}`} className="link" download>
          {file.name}
        </a>{" "}
        <span className="text-quiet">{fileSize(file.size)}, as it came</span>
      </p>
      <p className="mt-1 text-quiet">
        {`${used} of ${rows} rows read, ${mm(reading.from)} to ${mm(reading.to)}. ${DELIMITER_WORDS[delimiter] ? `Split at ${DELIMITER_WORDS[delimiter]}` : `Split at “${delimiter}”`}, decimal ${decimalMark}; position in ${positionUnit}, height in ${heightUnit}. `}
        {heading ? `Heading “${heading}”.` : "No heading."}
        {(columns > 2 || position > height) &&
          ` Of ${columns} columns, column ${position + 1} was read as the position and column ${height + 1} as the height.`}
        {averagedTo !== undefined
          ? ` The fit was given ${averagedTo} means of neighbouring points.`
          : used > drawn && ` The fit was given every point; ${drawn} are kept of the curves, for drawing.`}
      </p>
      {skippedInAll > 0 && (
        <details className="mt-1">
          <summary className="link w-fit cursor-pointer">
            {skippedInAll === 1 ? "1 row left out" : `${skippedInAll} rows left out`}
          </summary>
          <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`Rows left out, ${which} the film`}>
            <table className="table">
              <thead>
                <tr>
                  <th scope="col" className="num">
                    Row
                  </th>
                  <th scope="col">Column</th>
                  <th scope="col">What stands there</th>
                </tr>
              </thead>
              <tbody>
                {skipped.map(({ row, column, text }) => (
                  <tr key={row}>
                    <th scope="row" className="num font-normal">
                      {row}
                    </th>
                    <td>{column}</td>
                    <td className="wrap-anywhere">
                      {text === "" ? <span className="text-quiet">nothing</span> : text}
                    </td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
          {skippedInAll > skipped.length && (
            <p className="text-quiet">
              {skipped.length} of {skippedInAll} are listed, up to five of each cause.
            </p>
          )}
        </details>
      )}
      <p className="mt-1 text-label wrap-anywhere text-quiet">SHA-256 {file.hash}</p>
    </section>
  );
}
