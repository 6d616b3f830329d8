/** First bytes of files that are often dropped by mistake. */
const OTHER_FILES: readonly { name: string; bytes: readonly number[] }[] = [
  { name: "a zip archive (a spreadsheet saved as .xlsx is one too)", bytes: [0x50, 0x4b, 0x03, 0x04] },
  { name: "an empty zip archive", bytes: [0x50, 0x4b, 0x05, 0x06] },
  { name: "a PDF", bytes: [0x25, 0x50, 0x44, 0x46] },
  { name: "a PNG picture", bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: "a JPEG picture", bytes: [0xff, 0xd8, 0xff] },
  { name: "a GIF picture", bytes: [0x47, 0x49, 0x46, 0x38] },
  { name: "a TIFF picture", bytes: [0x49, 0x49, 0x2a, 0x00] },
  { name: "a TIFF picture", bytes: [0x4d, 0x4d, 0x00, 0x2a] },
  { name: "a gzip archive", bytes: [0x1f, 0x8b] },
  { name: "a 7z archive", bytes: [0x37, 0x7a, 0xbc, 0xaf] },
  { name: "a rar archive", bytes: [0x52, 0x61, 0x72, 0x21] },
  { name: "an old spreadsheet (.xls)", bytes: [0xd0, 0xcf, 0x11, 0xe0] },
  { name: "an HDF5 file", bytes: [0x89, 0x48, 0x44, 0x46] },
];

/** What a file is by its first bytes, in words, when it is none of text. */
export function otherFile(bytes: Uint8Array): string | null {
  return OTHER_FILES.find(({ bytes: start }) => start.every((byte, n) => bytes[n] === byte))?.name ?? null;
}
