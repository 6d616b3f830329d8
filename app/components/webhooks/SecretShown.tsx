import { Notice } from "#app/components/ui/Notice.tsx";

/** A webhook's secret, the one time that it is shown. */
export function SecretShown({ title, secret }: { title: string; secret: string }) {
  return (
    <Notice kind="done" title={`${title} Copy its secret now: it is not shown again.`}>
      <p>
        <code className="wrap-anywhere select-all">{secret}</code>
      </p>
    </Notice>
  );
}
