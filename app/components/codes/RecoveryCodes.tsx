/** Recovery codes that were just made: nothing shows them again. */
export function RecoveryCodes({ codes }: { codes: readonly string[] }) {
  return (
    <div className="max-w-160">
      <p>
        Each signs you in once in place of a code from your app. Print them or copy them now, and keep them apart from
        the device with the app: they are not shown again.
      </p>
      <ol className="mt-3 grid gap-x-8 gap-y-1 border-y border-line py-3 tablet:grid-cols-2">
        {codes.map((code) => (
          <li key={code}>
            <code className="whitespace-nowrap select-all">{code}</code>
          </li>
        ))}
      </ol>
    </div>
  );
}
