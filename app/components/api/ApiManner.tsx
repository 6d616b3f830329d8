const EXAMPLE = `curl -H "Authorization: Bearer $TOKEN" \\
  "https://planeward.site.example/api/v1/lots?limit=10"`;

/** What holds of every operation. */
export function ApiManner() {
  return (
    <section aria-labelledby="manner" className="max-w-160 space-y-2">
      <h2 id="manner" className="text-figure font-medium">
        How it is asked
      </h2>
      <pre className="frame overflow-x-auto p-3 text-label" tabIndex={0} aria-label="Example">
        {EXAMPLE}
      </pre>
      <p>
        Numbers are SI, with the unit in the name: <code>thickness_m</code>, <code>stress_Pa</code>. Bow is positive
        when the centre lies above the reference plane with the device side up; stress is positive in tension. Times are
        UTC.
      </p>
      <p>
        A list gives the newest first, 50 to a page; <code>next_cursor</code> of one page is <code>cursor</code> of the
        next, and null on the last.
      </p>
      <p>
        Every answer has an <code>ETag</code>. Sent back as <code>If-None-Match</code>, it spares what has not changed
        (304). A change takes it as <code>If-Match</code>: without it the answer is 428, and 412 where somebody changed
        the record since.
      </p>
      <p>
        A POST of JSON with an <code>Idempotency-Key</code> is done once: the same again within 24{"\u00A0"}hours gets
        the same answer, something else under that key is refused (422).
      </p>
      <p>
        A refusal is <code>application/problem+json</code> (RFC 9457); <code>errors</code> points at each fault. What is
        of another program looks as if it were not there (404). <code>RateLimit-Remaining</code> says how many requests
        of the minute are left, <code>Retry-After</code> how long to wait after a 429. <code>X-Request-Id</code> names
        the request to whoever runs the site.
      </p>
    </section>
  );
}
