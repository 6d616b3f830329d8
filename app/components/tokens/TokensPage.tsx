import type { SubmissionResult } from "@conform-to/react";
import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { TokensView } from "#app/schemas/api-token.ts";
import type { ProofFault } from "#app/schemas/proof.ts";
import { MakeToken } from "./MakeToken.tsx";
import { TokenList } from "./TokenList.tsx";

interface Props extends TokensView {
  revoked: boolean;
  made: string | null;
  lastResult: SubmissionResult<string[]> | undefined;
  proofFault: ProofFault | undefined;
}

/** The tokens with which other programs ask the API in the reader's name, and the form to make one. */
export function TokensPage({ rows, programs, ofAll, proofAsked, revoked, made, lastResult, proofFault }: Props) {
  return (
    <>
      <PageHead title="API tokens" remark={ofAll ? "of everybody on the site" : "your own"} />
      {made !== null && (
        <Notice kind="done" title="The token is made. Copy it now: it is not shown again.">
          <p>
            <code className="wrap-anywhere select-all">{made}</code>
          </p>
        </Notice>
      )}
      {revoked && made === null && <Notice kind="done" title="The token is revoked. Nothing can be asked with it." />}
      <p className="max-w-160 pb-4">
        With a token, a program of your own asks the <Link to="/api">API</Link> in your name: in one Planeward program,
        for what the token is made for, and never more than you may do yourself. Keep it like a password.
      </p>
      <div className="grid items-start gap-6 wide:grid-cols-[minmax(0,1fr)_480px]">
        {programs.length > 0 && (
          <MakeToken
            key={made ?? rows.length}
            programs={programs}
            lastResult={lastResult}
            proofAsked={proofAsked}
            proofFault={proofFault}
          />
        )}
        <div className="min-w-0 wide:-order-1">
          {rows.length === 0 ? (
            <EmptyState title="No token has been made">
              Make one where an instrument, a script or another system of the site is to ask Planeward.
            </EmptyState>
          ) : (
            <TokenList rows={rows} ofAll={ofAll} />
          )}
        </div>
      </div>
    </>
  );
}
