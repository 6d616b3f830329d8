import { useState } from "react";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { Watched } from "#app/schemas/changes.ts";
import { useChanges } from "./use-changes.ts";

interface Props {
  of: `${Watched}:${string}`;
  /** changes with what the page shows */
  since: string;
  /** what has happened, as a sentence */
  title: string;
  children: string;
}

/** Says that what the page shows was changed by somebody else since it came. It stays as it is: somebody may be typing. */
export function ChangedNotice({ of, since, title, children }: Props) {
  const [seen, setSeen] = useState<string | null>(null);
  useChanges([of], since, { own: false, changed: () => setSeen(since) });
  if (seen !== since) return null;
  return (
    <div className="screen-only">
      <Notice kind="caution" title={title}>
        {children}{" "}
        <a href="" className="link">
          Show it as it is now
        </a>
      </Notice>
    </div>
  );
}
