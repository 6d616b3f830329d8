import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { AuditState } from "#app/schemas/audit.ts";

const CRUMBS = [{ name: "Audit trail", path: "/audit" }];

/** Whether the trail still says what it said when it was sealed, chain by chain. */
export function AuditSeals({ state: { sealed, chains, faults } }: { state: AuditState }) {
  return (
    <>
      <PageHead
        title="Seals of the audit trail"
        crumbs={CRUMBS}
        remark={`${sealed} ${sealed === 1 ? "event" : "events"} sealed`}
      />
      {faults.length > 0 ? (
        <Notice kind="error" title="The trail does not agree with its seals">
          Somebody has changed, taken out or put in events past every rule of the database. Keep the database as it is,
          take a copy, and tell whoever answers for this site.
        </Notice>
      ) : (
        sealed > 0 && <Notice kind="done" title="Every event is as it was sealed, and none is missing." />
      )}
      <p className="mb-4 max-w-160">
        Each event has a number in the chain of its program and a hash over itself and the one before it. Write the
        newest hashes down elsewhere from time to time: a chain that was cut off at its end shows by them alone.
      </p>
      {chains.length === 0 ? (
        <EmptyState title="Nothing is sealed yet">Events are sealed within a minute of being written.</EmptyState>
      ) : (
        <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Chains">
          <table className="table">
            <caption className="sr-only">Chains of the audit trail, each with its newest hash</caption>
            <thead>
              <tr>
                <th scope="col">Chain</th>
                <th scope="col" className="num">
                  Events
                </th>
                <th scope="col">Newest sealed</th>
                <th scope="col">Newest hash, SHA-256</th>
              </tr>
            </thead>
            <tbody>
              {chains.map(({ program, count, hash, at }) => (
                <tr key={hash}>
                  <th scope="row" className="font-normal">
                    {program ?? "Site"}
                  </th>
                  <td className="num">{count}</td>
                  <td className="whitespace-nowrap">{minuteOf(at)}</td>
                  <td className="font-mono wrap-anywhere">{hash}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {faults.length > 0 && (
        <div className="mt-6 overflow-x-auto" tabIndex={0} role="region" aria-label="Faults">
          <table className="table">
            <caption className="text-left font-semibold">What is wrong, up to 100</caption>
            <thead>
              <tr>
                <th scope="col">Chain</th>
                <th scope="col" className="num">
                  Number
                </th>
                <th scope="col">Event</th>
                <th scope="col">Fault</th>
              </tr>
            </thead>
            <tbody>
              {faults.map(({ program, number, eventId, fault }) => (
                <tr key={`${eventId} ${fault}`}>
                  <th scope="row" className="font-normal">
                    {program ?? "Site"}
                  </th>
                  <td className="num">{number ?? "–"}</td>
                  <td className="wrap-anywhere">{eventId}</td>
                  <td>{fault}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </>
  );
}
