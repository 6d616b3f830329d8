import { useId } from "react";
import { Form } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";
import { importProfileWords } from "#app/lib/import-profile-words.ts";
import type { ImportProfileRow } from "#app/schemas/import-profile.ts";

/** Why a change of a profile was not made. */
export interface ProfileAnswer {
  id: string;
  sentence: string;
}

/** The instruments with what is kept of their files; each can be renamed and removed. */
export function ImportProfileList({
  profiles,
  answer,
}: {
  profiles: readonly ImportProfileRow[];
  answer: ProfileAnswer | null;
}) {
  return (
    <ul className="border-t border-ink">
      {profiles.map((profile) => (
        <li key={profile.id} id={`profile-${profile.id}`} className="scroll-mt-4 border-b border-line py-3">
          <ProfileItem profile={profile} fault={answer?.id === profile.id ? answer.sentence : null} />
        </li>
      ))}
    </ul>
  );
}

function ProfileItem({
  profile: { id, name, profile, stamp },
  fault,
}: {
  profile: ImportProfileRow;
  fault: string | null;
}) {
  const field = useId();
  const words = importProfileWords(profile);
  return (
    <>
      {fault !== null && <Notice kind="error" title={fault} />}
      <h2 className="font-semibold wrap-anywhere">{name}</h2>
      <p className="max-w-240 wrap-anywhere text-quiet">
        {words.length === 0 ? "Everything is left to the file." : `${capital(words.join("; "))}.`}
      </p>
      <p className="text-label text-quiet">
        {stamp.updatedBy}, {stamp.updatedAt.slice(0, 10)}
      </p>
      <div className="mt-1 flex flex-wrap gap-x-6 gap-y-1">
        <details open={fault !== null || undefined} key={`name ${stamp.version}`}>
          <summary className="link w-fit cursor-pointer">Rename</summary>
          <Form method="post" preventScrollReset className="mt-2 flex flex-wrap items-end gap-2">
            <input type="hidden" name="id" value={id} />
            <input type="hidden" name="version" value={stamp.version} />
            <div className="field w-64">
              <label htmlFor={field}>Name of the instrument</label>
              <input id={field} name="name" maxLength={80} autoComplete="off" defaultValue={name} />
            </div>
            <button type="submit" name="intent" value="rename" className="btn" aria-label={`Rename ${name}`}>
              Rename
            </button>
          </Form>
        </details>
        <details>
          <summary className="link w-fit cursor-pointer text-stop">Remove</summary>
          <Form method="post" preventScrollReset className="mt-2 flex flex-wrap items-center gap-4">
            <input type="hidden" name="id" value={id} />
            <input type="hidden" name="version" value={stamp.version} />
            <p>The next file of {name} is asked about again. What was read stays, and scans keep its name.</p>
            <button type="submit" name="intent" value="remove" className="btn btn-remove" aria-label={`Remove ${name}`}>
              Remove for good
            </button>
          </Form>
        </details>
      </div>
    </>
  );
}

const capital = (sentence: string) => sentence.charAt(0).toUpperCase() + sentence.slice(1);
