import sharp from "sharp";
import { photoKind } from "#app/lib/photo-kind.ts";
import type { PhotoType } from "#app/schemas/incident-photo.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { fileHash } from "../scan-files.server.ts";

/** A picture as it is kept. */
export interface ReadPhoto {
  type: PhotoType;
  width: number;
  height: number;
  sha256: string;
  bytes: Uint8Array<ArrayBuffer>;
}

/** Longest side of a kept picture, pixels: enough to see a hairline crack over a tenth of a wafer. */
const LONGEST_SIDE = 2000;
/** A picture of more pixels than any camera of a fab makes is refused before it is unpacked. */
const MOST_PIXELS = 120_000_000;

/**
 * Draws a picture anew from its pixels: the right way up, smaller where it is large, and without anything else that was in the file,
 * the place where it was taken above all. A sentence says why it is refused.
 */
export async function readPhoto(file: UploadedFile): Promise<ReadPhoto | { refused: string }> {
  const type = photoKind(file);
  if (typeof type !== "string") return type;
  try {
    const picture = sharp(file.bytes, { failOn: "error", limitInputPixels: MOST_PIXELS, pages: 1 })
      .autoOrient()
      .resize({ width: LONGEST_SIDE, height: LONGEST_SIDE, fit: "inside", withoutEnlargement: true })
      .toColourspace("srgb");
    const drawn = await (type === "image/jpeg" ? picture.jpeg({ quality: 85 }) : picture.png()).toBuffer({
      resolveWithObject: true,
    });
    const bytes = new Uint8Array(drawn.data);
    return { type, width: drawn.info.width, height: drawn.info.height, sha256: await fileHash(bytes), bytes };
  } catch {
    return {
      refused: `“${file.name}” could not be read as a picture: it is damaged, or larger than 120 million pixels. Open it, save it anew as JPEG and attach that.`,
    };
  }
}
