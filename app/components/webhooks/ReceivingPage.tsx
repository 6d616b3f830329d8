import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { eventWords, WEBHOOK_EVENT_NAMES, type WebhookEventName } from "#app/schemas/webhook.ts";
import { CHECK } from "./check-example.ts";

/** The same for every event. */
const HEAD = `{
  "id": "3f0e7a52-9c1d-4b1e-8c51-6f0e2a7d9b44",
  "event": "sheet.released",
  "at": "2026-12-03T07:40:12.512Z",
  "program": { "slug": "tern", "name": "Tern" },
  "data": {
    "revision_id": "…",
    "assessment_id": "…",
    "sheet": "TERN-H003",
    "revision": "B",
    "flow": "Tern T-2, to 100 µm"
  }
}`;

const DATA: Record<WebhookEventName, string> = {
  "sheet.released": "revision_id, assessment_id, sheet, revision, flow",
  "sheet.superseded": "revision_id, assessment_id, sheet, revision, flow, superseded_by",
  "assessment.out_of_date": "assessment_id, assessment, flow",
  "incident.reported": "incident_id, incident, kind, severity, lot_id, lot, step, step_title",
  "step.stopped": "stop_id, lot_id, lot, flow, step, step_title",
};

/** What a receiver gets and how it checks that it comes from here, for whoever writes one. */
export function ReceivingPage({
  example,
}: {
  example: { secret: string; timestamp: number; body: string; signature: string };
}) {
  return (
    <>
      <PageHead title="Receiving webhooks" crumbs={[{ name: "Webhooks", path: "/webhooks" }]} />
      <HungSection title="What comes">
        <div className="max-w-160 space-y-2">
          <p>A POST of JSON, in UTF-8, with these headers:</p>
          <ul className="list-disc space-y-1 pl-5">
            <li>
              <code>Planeward-Delivery</code>: the id of the delivery, the same at each attempt
            </li>
            <li>
              <code>Planeward-Timestamp</code>: when it was sent, in seconds since 1970 (UTC)
            </li>
            <li>
              <code>Planeward-Signature</code>: <code>v1=</code> and 64 hexadecimal digits
            </li>
          </ul>
          <pre className="frame overflow-x-auto p-3 text-label" tabIndex={0} aria-label="Example of a body">
            {HEAD}
          </pre>
          <p>
            <code>id</code> names what happened: it is the same when something is sent again, so whoever has seen it
            takes it once. More may come into <code>data</code> one day; nothing goes out of it.
          </p>
          <p>
            A delivery says that something has happened, and not how things stand now. Before anybody acts on it, ask
            the{" "}
            <Link to="/api" className="link">
              API
            </Link>{" "}
            or open the sheet: it may be superseded by then. It takes the place of no run card and of no procedure of
            the site.
          </p>
        </div>
      </HungSection>
      <HungSection title="Events">
        <dl className="max-w-160 space-y-2">
          {WEBHOOK_EVENT_NAMES.map((event) => (
            <div key={event}>
              <dt>
                <code>{event}</code>, {eventWords(event).toLowerCase()}
              </dt>
              <dd className="wrap-anywhere text-quiet">
                <code>{DATA[event]}</code>
              </dd>
            </div>
          ))}
          <div>
            <dt>
              <code>test</code>, somebody tries whether deliveries arrive
            </dt>
            <dd className="text-quiet">
              <code>webhook_id, webhook</code>
            </dd>
          </div>
        </dl>
      </HungSection>
      <HungSection title="How to check it">
        <div className="max-w-160 space-y-2">
          <ol className="list-decimal space-y-1 pl-5">
            <li>Take the body as the bytes that came, before anything has parsed them.</li>
            <li>
              Make HMAC-SHA-256 (RFC 2104) under the webhook’s secret, whole as it was shown, over the timestamp, a
              point and the body.
            </li>
            <li>Compare all of it with the signature, in a time that does not depend on where they differ.</li>
            <li>
              Refuse what is more than five minutes ({"300\u00A0s"}) away from your clock, so that nobody sends an old
              one once more, and pass over an <code>id</code> that you have had.
            </li>
          </ol>
          <pre className="frame overflow-x-auto p-3 text-label" tabIndex={0} aria-label="Example of a check">
            {CHECK}
          </pre>
          <p>To try your own: with these, the signature is as below. Its time is long over.</p>
          <pre className="frame overflow-x-auto p-3 text-label" tabIndex={0} aria-label="Example of a signature">
            {`secret     ${example.secret}\ntimestamp  ${example.timestamp}\nbody       ${example.body}\nsignature  ${example.signature}`}
          </pre>
        </div>
      </HungSection>
      <HungSection title="What to answer">
        <div className="max-w-160 space-y-2">
          <p>
            Any status from 200 to 299, within {"10\u00A0s"}: take it, answer, work on it afterwards. Anything else, a
            redirect included, is a failure. It is tried again up to 14 times within some seven{"\u00A0"}hours, each
            time after a longer pause, then parked with its reason; the log of the webhook has a button to send it once
            more.
          </p>
          <p>
            A webhook of which every attempt has failed for three days, twenty or more in a row, is switched off, and
            whoever made it is told by mail. Deliveries come in any order. Of an answer the first 500 characters are
            kept for the log, for thirty days.
          </p>
          <p>
            Receivers have an address of the public internet, or of a network that the operator of this copy has named.
          </p>
        </div>
      </HungSection>
    </>
  );
}
