import type { PhotoType } from "#app/schemas/incident-photo.ts";

/** Brands of the container that phones keep their pictures in, as they stand in its first box. */
const PHONE_BRANDS = ["heic", "heix", "heim", "heis", "hevc", "hevx", "mif1", "msf1", "avif", "avis"];

const begins = (bytes: Uint8Array, signature: readonly number[], from = 0) =>
  signature.every((byte, at) => bytes[from + at] === byte);
const textAt = (bytes: Uint8Array, from: number) => String.fromCharCode(...bytes.slice(from, from + 4));

/** What a file is by its own first bytes, whatever it is called: a picture that is kept, or why it is not, in a sentence. */
export function photoKind({ name, bytes }: { name: string; bytes: Uint8Array }): PhotoType | { refused: string } {
  if (begins(bytes, [0xff, 0xd8, 0xff])) return "image/jpeg";
  if (begins(bytes, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return "image/png";
  if (textAt(bytes, 4) === "ftyp" && PHONE_BRANDS.includes(textAt(bytes, 8)))
    return {
      refused: `“${name}” is an HEIC or AVIF picture, which many browsers do not show. On the phone choose the most compatible format in the settings of the camera, or open the picture, share or export it as JPEG, and attach that.`,
    };
  return {
    refused: `“${name}” is neither a JPEG nor a PNG picture by its content, whatever its name says. Attach a JPEG or PNG.`,
  };
}
