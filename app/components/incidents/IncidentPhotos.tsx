import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { fileSize } from "#app/lib/file-size.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { MOST_PHOTOS } from "#app/schemas/incident-photo.ts";
import type { IncidentView } from "#app/schemas/incident.ts";
import { PhotoField } from "./PhotoField.tsx";

/** The photos of an incident, each a link to its full size, and a form to add some while it is not closed. */
export function IncidentPhotos({ incident, faults }: { incident: IncidentView; faults: readonly string[] }) {
  const { id, number, photos, mayReport, state } = incident;
  const open = mayReport && state !== "closed" && photos.length < MOST_PHOTOS;
  if (photos.length === 0 && !open) return null;
  return (
    <HungSection title="Photos" remark={photos.length === 0 ? "None yet" : `${photos.length} of up to ${MOST_PHOTOS}`}>
      <ul className="flex flex-wrap gap-4">
        {photos.map((photo, index) => {
          const path = `/incidents/${id}/photos/${photo.id}`;
          return (
            <li key={photo.id} className="keep-whole max-w-full">
              <a href={path} className="link">
                <img
                  src={path}
                  width={photo.width}
                  height={photo.height}
                  alt={`Photo ${index + 1} of ${number}, in full size`}
                  className="h-auto max-h-70 w-auto max-w-full border border-edge"
                  loading="lazy"
                />
              </a>
              <p className="text-label text-quiet">
                {minuteOf(photo.addedAt)}, {photo.addedBy}, {fileSize(photo.size)}
              </p>
            </li>
          );
        })}
      </ul>
      {open && (
        <Form key={photos.length} method="post" encType="multipart/form-data" className="screen-only mt-3 max-w-160">
          <PhotoField id="photos" faults={faults} again={faults.length > 0} />
          <input type="hidden" name="intent" value="photos" />
          <div className="mt-2">
            <SubmitButton busy="Adding">Add photos</SubmitButton>
          </div>
        </Form>
      )}
    </HungSection>
  );
}
