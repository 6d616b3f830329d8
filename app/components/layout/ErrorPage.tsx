import { isRouteErrorResponse, Link } from "react-router";

const TITLES: Record<number, string> = {
  400: "That request could not be understood",
  401: "Please sign in",
  403: "That is not yours to do",
  404: "Nothing here",
  405: "That cannot be done here",
  409: "Somebody was faster",
  413: "That file is too large",
};

/** The sentence of a refusal, when the error carries one. */
function sentenceOf(error: unknown): string | null {
  if (!isRouteErrorResponse(error)) return null;
  const body: unknown = error.data;
  if (typeof body === "object" && body !== null && "sentence" in body && typeof body.sentence === "string")
    return body.sentence;
  return null;
}

/** Whether the page's data could not be fetched: a browser then throws a TypeError, in words of its own. */
const isUnreachable = (error: unknown) =>
  error instanceof TypeError && /fetch|network|load failed/i.test(error.message);

/** What happened, what it means for the work, and where to go. Never a stack trace. */
export function ErrorPage({ status, error }: { status: number; error: unknown }) {
  if (isUnreachable(error)) return <Unreachable />;
  const sentence =
    sentenceOf(error) ??
    (status === 404
      ? "The address is wrong, or what it named is gone."
      : "Something went wrong on our side. Nothing that was saved is lost; please try again.");
  return (
    <section className="frame max-w-160 p-6" aria-labelledby="error-title">
      <p className="text-label text-quiet">{status}</p>
      <h1 id="error-title" className="text-answer font-medium">
        {TITLES[status] ?? "Something went wrong"}
      </h1>
      <p className="mt-2">{sentence}</p>
      <p className="mt-4">
        <Link to="/" className="link">
          Go to Today
        </Link>
      </p>
    </section>
  );
}

function Unreachable() {
  return (
    <section className="frame max-w-160 p-6" aria-labelledby="error-title">
      <h1 id="error-title" className="text-answer font-medium">
        No way to the server
      </h1>
      <p className="mt-2">
        This device is offline, or the server is being restarted. What was saved is saved; what you were sending may not
        be: look before you send it again.
      </p>
      <p className="mt-4">
        <a href="" className="btn">
          Try again
        </a>
      </p>
    </section>
  );
}
