import { ErrorPage } from "#app/components/layout/ErrorPage.tsx";
import { FloorHead } from "./FloorHead.tsx";

/** What was refused on the floor, with the way back to where a lot is found. */
export function FloorRefused({ status, error }: { status: number; error: unknown }) {
  return (
    <>
      <FloorHead person="" />
      <main id="main" className="mx-auto max-w-page px-4 py-6 tablet:px-6">
        <ErrorPage status={status} error={error} />
        <p className="mt-6">
          <a href="/floor" className="btn min-h-27 w-full text-figure tablet:w-80">
            Find a lot
          </a>
        </p>
      </main>
    </>
  );
}
