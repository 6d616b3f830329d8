import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { ListPage } from "#app/lib/list-params.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import {
  DELIVERY_STATES,
  eventWords,
  WEBHOOK_EVENT_NAMES,
  type DeliveryRow,
  type WebhookRow,
} from "#app/schemas/webhook.ts";
import { DELIVERY_COLUMNS, DELIVERY_STATE_WORDS } from "./delivery-columns.tsx";
import { stateWords } from "./state-words.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";

interface Props {
  webhook: WebhookRow & { secretMadeAt: string };
  page: ListPage<DeliveryRow>;
  proofAsked: ProofAsked;
  proofFault: ProofFault | undefined;
}

const EVENT_OPTIONS = [...WEBHOOK_EVENT_NAMES, "test" as const].map((value) => ({ value, label: eventWords(value) }));

/** One webhook: what it is, what can be done with it, and what it was told. */
export function WebhookPage({ webhook, page, proofAsked, proofFault }: Props) {
  return (
    <>
      <About webhook={webhook} />
      <HungSection title="Deliveries" remark="of the last thirty days">
        <Deliveries page={page} />
      </HungSection>
      <HungSection title="Secret" remark={`made ${minuteOf(webhook.secretMadeAt)}`}>
        <Form method="post" className="max-w-160 space-y-2">
          <input type="hidden" name="intent" value="renew" />
          <p>
            With another secret, what is sent from then on is signed with that one. A receiver that still has the old
            one refuses it, and gets it again once it has the new one, for some seven{"\u00A0"}hours.
          </p>
          <ProofFields asked={proofAsked} fault={proofFault} label="Your password, to renew it" />
          <SubmitButton busy="Renewing">Renew the secret</SubmitButton>
        </Form>
      </HungSection>
      <HungSection title="Delete">
        <Form method="post" className="max-w-160 space-y-2">
          <input type="hidden" name="intent" value="delete" />
          <p>Nothing is sent to it any more, and its log goes with it. To keep the log, switch it off.</p>
          <SubmitButton busy="Deleting" removes>
            Delete the webhook
          </SubmitButton>
        </Form>
      </HungSection>
    </>
  );
}

function About({ webhook }: Pick<Props, "webhook">) {
  const { program, address, events, madeBy, state } = webhook;
  const { words, tone } = stateWords(webhook);
  const facts = [
    { label: "State", value: <span className={tone}>{words}</span> },
    { label: "Program", value: program },
    { label: "Address", value: <code>{address}</code> },
    { label: "Told when", value: events.map(eventWords).join("; ") },
    { label: "Made by", value: madeBy },
  ];
  return (
    <div className="pb-6">
      <dl className="grid gap-x-4 tablet:grid-cols-[144px_minmax(0,1fr)]">
        {facts.map(({ label, value }) => (
          <div key={label} className="contents">
            <dt className="text-quiet">{label}</dt>
            <dd className="wrap-anywhere max-tablet:mb-2">{value}</dd>
          </div>
        ))}
      </dl>
      <div className="mt-4 flex flex-wrap gap-2">
        {state === "on" && <Deed intent="test">Send a test</Deed>}
        <Deed intent={state === "on" ? "off" : "on"}>{state === "on" ? "Switch off" : "Switch on"}</Deed>
      </div>
    </div>
  );
}

function Deed({ intent, children }: { intent: string; children: string }) {
  return (
    <Form method="post">
      <button type="submit" name="intent" value={intent} className="btn">
        {children}
      </button>
    </Form>
  );
}

function Deliveries({ page }: Pick<Props, "page">) {
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  return (
    <>
      <ListHead
        what="sheets, lots, steps"
        filters={[
          {
            name: "state",
            label: "State",
            options: DELIVERY_STATES.map((value) => ({ value, label: DELIVERY_STATE_WORDS[value] })),
          },
          { name: "event", label: "Event", options: EVENT_OPTIONS },
        ]}
      />
      {page.total > 0 ? (
        <DataTable caption="Deliveries" columns={DELIVERY_COLUMNS} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title={searched ? "No delivery fits" : "Nothing has been sent yet"}>
          {searched
            ? "Change the search, or take a filter away."
            : "What happens in the program stands here, with how far it is. Send a test to see whether it arrives."}
        </EmptyState>
      )}
    </>
  );
}
