import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { DeliveryAttempt, DeliveryView } from "#app/schemas/webhook.ts";
import { DELIVERY_STATE_WORDS, howItStands } from "./delivery-columns.tsx";

/** One delivery: what was sent, and what was answered at each attempt. */
export function DeliveryPage({ delivery }: { delivery: DeliveryView }) {
  const { state, body, tries, byHand, mayReplay, webhook, id } = delivery;
  const ended = state === "sent" || state === "parked";
  const stands = howItStands(delivery);
  return (
    <>
      <p className="max-w-160 pb-4 wrap-anywhere">
        <span className={state === "parked" ? "font-semibold text-stop" : "font-semibold"}>
          {DELIVERY_STATE_WORDS[state]}
          {stands && ": "}
        </span>
        {stands} Written {minuteOf(delivery.createdAt)}
        {byHand !== null && `, sent by hand by ${byHand}`}.
      </p>
      <HungSection title="Sent" remark="the body is what is signed">
        <p className="wrap-anywhere">
          <code>POST {webhook.address}</code>
        </p>
        <p className="wrap-anywhere">
          <code>Planeward-Delivery: {id}</code>
        </p>
        <pre className="frame mt-2 overflow-x-auto p-3 text-label" tabIndex={0} aria-label="Body">
          {indented(body)}
        </pre>
      </HungSection>
      <HungSection title="Answered" remark={tries.length === 1 ? "at one attempt" : `at ${tries.length} attempts`}>
        {tries.length === 0 ? (
          <EmptyState title="Not tried yet">Each attempt stands here, with what was answered.</EmptyState>
        ) : (
          <ol className="space-y-3">
            {tries.toReversed().map((tried) => (
              <Attempt key={tried.at} {...tried} />
            ))}
          </ol>
        )}
      </HungSection>
      {ended && mayReplay && (
        <HungSection title="Once more">
          <Form method="post" className="max-w-160 space-y-2">
            <p>
              The same is sent as another delivery, signed anew. Its receiver knows the event by its id,{" "}
              <code className="wrap-anywhere">{delivery.eventId}</code>.
            </p>
            <SubmitButton busy="Sending">Send it again</SubmitButton>
          </Form>
        </HungSection>
      )}
      {ended && !mayReplay && (
        <p>
          The webhook is off.{" "}
          <Link to={`/webhooks/${webhook.id}`} className="link">
            Switch it on
          </Link>{" "}
          to send this again.
        </p>
      )}
    </>
  );
}

function Attempt({ at, milliseconds, status, said }: DeliveryAttempt) {
  return (
    <li>
      <p>
        {minuteOf(at)}, after {milliseconds}
        {"\u00A0"}ms: {status === null ? said : <strong>{status}</strong>}
      </p>
      {status !== null && said !== "" && (
        <pre
          className="frame mt-1 overflow-x-auto p-3 text-label"
          tabIndex={0}
          aria-label={`Answer of ${minuteOf(at)}`}
        >
          {said}
        </pre>
      )}
    </li>
  );
}

/** The body line by line, to be read; what is signed has no such lines. */
function indented(body: string): string {
  try {
    return JSON.stringify(JSON.parse(body), null, 2);
  } catch {
    return body;
  }
}
