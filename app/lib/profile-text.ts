/** A file that is no profile, with the sentence for the person who chose it. */
export class ProfileFileError extends Error {}

/** First bytes of files that are often dropped by mistake. */
const OTHER_FILES: { name: string; bytes: number[] }[] = [
  { name: "a zip archive (a spreadsheet saved as .xlsx is one too)", bytes: [0x50, 0x4b, 0x03, 0x04] },
  { name: "an empty zip archive", bytes: [0x50, 0x4b, 0x05, 0x06] },
  { name: "a PDF", bytes: [0x25, 0x50, 0x44, 0x46] },
  { name: "a PNG picture", bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: "a JPEG picture", bytes: [0xff, 0xd8, 0xff] },
  { name: "a gzip archive", bytes: [0x1f, 0x8b] },
  { name: "an old spreadsheet (.xls)", bytes: [0xd0, 0xcf, 0x11, 0xe0] },
];

const WHAT_TO_DO = "Export the profile as CSV with two columns.";

/**
 * The text of a file, lines ended by a line feed. UTF-8 and UTF-16 are told by the file, anything else is read as windows-1252.
 * @throws ProfileFileError for what is no text, or empty
 */
export function profileText(bytes: Uint8Array, name: string): string {
  if (bytes.length === 0) throw new ProfileFileError(`${name} is empty. Choose the file that the profilometer wrote.`);
  const other = OTHER_FILES.find(({ bytes: start }) => start.every((byte, index) => bytes[index] === byte));
  if (other) throw new ProfileFileError(`${name} is ${other.name}, not a text file. ${WHAT_TO_DO}`);
  const text = decode(bytes);
  if (text.includes("\0")) throw new ProfileFileError(`${name} is not a text file. ${WHAT_TO_DO}`);
  if (text.trim() === "")
    throw new ProfileFileError(`${name} holds nothing but blanks. Choose the file that the profilometer wrote.`);
  return text.replace(/\r\n?/g, "\n");
}

function decode(bytes: Uint8Array): string {
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return new TextDecoder("utf-16le").decode(bytes);
  if (first === 0xfe && second === 0xff) return new TextDecoder("utf-16be").decode(bytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}
