import type { SubmissionResult } from "@conform-to/react";
import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { WebhooksView } from "#app/schemas/webhook.ts";
import { MakeWebhook } from "./MakeWebhook.tsx";
import { SecretShown } from "./SecretShown.tsx";
import { WebhookList } from "./WebhookList.tsx";
import type { ProofFault } from "#app/schemas/proof.ts";

interface Props extends WebhooksView {
  deleted: boolean;
  /** the secret of the one that was just made */
  secret: string | null;
  lastResult: SubmissionResult<string[]> | undefined;
  proofFault: ProofFault | undefined;
}

/** The webhooks of the reader and of the programs that they look after, and the form to make one. */
export function WebhooksPage({ rows, programs, proofAsked, deleted, secret, lastResult, proofFault }: Props) {
  return (
    <>
      <PageHead title="Webhooks" />
      {secret !== null && <SecretShown title="The webhook is made." secret={secret} />}
      {deleted && secret === null && <Notice kind="done" title="The webhook and its log are deleted." />}
      <p className="max-w-160 pb-4">
        A webhook posts what happens in a program to an address of yours, signed. It names what it is about, such as a
        sheet and its revision, and holds no figures: those are asked for by the{" "}
        <Link to="/api" className="link">
          API
        </Link>
        .{" "}
        <Link to="/webhooks/receiving" className="link">
          How a receiver checks a delivery
        </Link>
      </p>
      <div className="grid items-start gap-6 wide:grid-cols-[minmax(0,1fr)_480px]">
        <MakeWebhook
          key={secret ?? rows.length}
          programs={programs}
          lastResult={lastResult}
          proofAsked={proofAsked}
          proofFault={proofFault}
        />
        <div className="min-w-0 wide:-order-1">
          {rows.length === 0 ? (
            <EmptyState title="No webhook has been made">
              Make one where another system of the site is to know at once that a sheet is released or a step is
              stopped.
            </EmptyState>
          ) : (
            <WebhookList rows={rows} />
          )}
        </div>
      </div>
    </>
  );
}
