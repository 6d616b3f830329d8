import {
  FormDataParseError,
  MaxFilesExceededError,
  MaxFileSizeExceededError,
  MaxHeaderSizeExceededError,
  MaxPartsExceededError,
  MaxTotalSizeExceededError,
  parseFormData,
} from "@remix-run/form-data-parser";
import { ownFields } from "./form.server.ts";
import { problem } from "./problem.server.ts";

/** A file as it came. */
export interface UploadedFile {
  name: string;
  bytes: Uint8Array<ArrayBuffer>;
}

export interface Upload<Field extends string> {
  /** the text fields */
  formData: FormData;
  /** the files that are within the limit, by their field */
  files: Partial<Record<Field, UploadedFile>>;
  /** name and size, bytes, of those that are not: read so that what was typed beside them is not lost, then dropped */
  tooLarge: Partial<Record<Field, { name: string; size: number }>>;
}

/** A file up to three times the limit, and not more than so much above it, bytes, is refused at its field; beyond it reading stops. */
const MOST_ABOVE = 12 * 1024 * 1024;
const MOST_PARTS = 60;
/** Files beyond those that belong in a form are read up to so many times their number, so that it can be said. */
const MORE_FILES = 3;

/**
 * Reads a posted form with files.
 * @param fields names of the file fields; files under other names are dropped
 * @param limit most bytes of a file
 * @throws 413 when a file is far beyond the limit, 400 for a body that is no form
 */
export async function readUpload<Field extends string>(
  request: Request,
  fields: readonly Field[],
  limit: Limit,
): Promise<Upload<Field>> {
  const upload: Omit<Upload<Field>, "formData"> = { files: {}, tooLarge: {} };
  const maxTotalSize = (readUpTo(limit) + 1) * fields.length;
  const most = { maxFiles: fields.length, maxTotalSize };
  const formData = await readParts(request, fields, most, limit, (field, name, file) => {
    if ("bytes" in file) upload.files[field] = { name, bytes: file.bytes };
    else upload.tooLarge[field] = { name, size: file.size };
  });
  return { ...upload, formData };
}

/**
 * The same for a form with one field that takes several files, in the order in which they were chosen.
 * @param most files that belong in it; some more are read all the same, so that the caller can say so
 */
export async function readUploads(
  request: Request,
  field: string,
  most: number,
  limit: Limit,
): Promise<{ formData: FormData; files: UploadedFile[]; tooLarge: { name: string; size: number }[] }> {
  const [files, tooLarge]: [UploadedFile[], { name: string; size: number }[]] = [[], []];
  const more = { maxFiles: MORE_FILES * most, maxTotalSize: (limit.bytes + 1) * most };
  const formData = await readParts(request, [field], more, limit, (_, name, file) => {
    if ("bytes" in file) files.push({ name, bytes: file.bytes });
    else tooLarge.push({ name, size: file.size });
  });
  return { formData, files, tooLarge };
}

/** Most bytes of a file that are read, so that one that is too large can be refused at its field. */
const readUpTo = ({ bytes }: Limit) => Math.min(3 * bytes, bytes + MOST_ABOVE);

interface Limit {
  bytes: number;
  words: string;
}

async function readParts<Field extends string>(
  request: Request,
  fields: readonly Field[],
  most: { maxFiles: number; maxTotalSize: number },
  limit: Limit,
  take: (field: Field, name: string, file: { bytes: Uint8Array<ArrayBuffer> } | { size: number }) => void,
): Promise<FormData> {
  try {
    const formData = await parseFormData(
      request,
      { ...most, maxFileSize: readUpTo(limit), maxParts: MOST_PARTS + most.maxFiles },
      async (file) => {
        const field = fields.find((name) => name === file.fieldName);
        // A field that was left empty comes as a file without name and content.
        if (field === undefined || (file.name === "" && file.size === 0)) return;
        const large = file.size > limit.bytes;
        take(field, safeFileName(file.name), large ? { size: file.size } : { bytes: await file.bytes() });
      },
    );
    for (const field of fields) formData.delete(field);
    return ownFields(formData);
  } catch (error) {
    throw refusalOf(error, limit.words);
  }
}

const TOO_LARGE = [MaxFileSizeExceededError, MaxTotalSizeExceededError];
/** A body that is no form, or one that our form cannot send; a text that is no UTF-8 shows as a TypeError. */
const NO_FORM = [
  FormDataParseError,
  MaxFilesExceededError,
  MaxHeaderSizeExceededError,
  MaxPartsExceededError,
  TypeError,
];

function refusalOf(error: unknown, words: string): unknown {
  if (TOO_LARGE.some((kind) => error instanceof kind))
    return problem(413, `A file may have up to ${words}. Go back and choose a smaller one; nothing was stored.`);
  if (NO_FORM.some((kind) => error instanceof kind))
    return problem(400, "The form could not be read. Go back and send it again; nothing was stored.");
  return error;
}

/** The last part of a file's path without characters that cannot be shown, at most 200 long. */
function safeFileName(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? "";
  const plain = [...last.replace(/\p{C}+/gu, "").trim()].slice(0, 200).join("");
  return plain === "" ? "profile.csv" : plain;
}
