import { Link } from "react-router";
import { LibraryDetail } from "#app/components/library/LibraryDetail.tsx";
import { givenRows, propertyRows } from "#app/components/library/property.ts";
import type { LibraryRecords, LibraryUse } from "#app/schemas/library-records.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { FILM_HANDLING_PROPERTIES, FILM_PROPERTIES } from "./film-properties.ts";
import { filmAnswer, filmHistory, measuredOn } from "./film-words.ts";

interface Props {
  record: LibraryRecords["film"];
  stamp: RecordStamp;
  mayEdit: boolean;
  uses: LibraryUse[];
  /** whether they may ask what a change of it would do */
  mayAsk: boolean;
}

const { zeroStressTemperature: _polymersAlone, ...OF_EVERY_FILM } = FILM_PROPERTIES;

const ownRows = (film: Props["record"]) =>
  film.kind === "polymer" ? propertyRows(film, FILM_PROPERTIES) : propertyRows(film, OF_EVERY_FILM);

/** A film: every property with its source, and where it is used. */
export function FilmDetail(props: Props) {
  const { record, mayAsk } = props;
  return (
    <LibraryDetail
      {...props}
      crumbs={[{ name: "Films", path: "/films" }]}
      view={{
        answer: filmAnswer(record),
        because: filmHistory(record),
        properties: [...ownRows(record), ...givenRows(record.handling, FILM_HANDLING_PROPERTIES)],
        facts: [
          { label: "Kind", value: record.kind },
          { label: "State of the stress", value: record.stressState || "not given" },
          { label: "Stress measured on", value: measuredOn(record.handling) },
        ],
      }}
    >
      <p className="px-4 pb-4 tablet:px-6">
        <Link to={`/films/compare?of=${record.id}`} className="link">
          Compare with another film
        </Link>
        {mayAsk && (
          <>
            {" · "}
            <Link to={`/assessments/change-request?of=film:${record.id}`} className="link">
              What would change?
            </Link>
            {" · "}
            <Link to={`/predictions?of=stress&film=${record.id}`} className="link">
              Predicted against measured
            </Link>
          </>
        )}
      </p>
    </LibraryDetail>
  );
}
