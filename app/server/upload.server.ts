import {
  FormDataParseError,
  MaxFilesExceededError,
  MaxFileSizeExceededError,
  MaxHeaderSizeExceededError,
  MaxPartsExceededError,
  MaxTotalSizeExceededError,
  parseFormData,
} from "@remix-run/form-data-parser";
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

/**
 * Reads a posted form with files.
 * @param fields names of the file fields; files under other names are dropped
 * @param limit most bytes of a file
 * @throws 413 when a file is far beyond the limit, 400 for a body that is no form
 */
export async function readUpload<Field extends string>(
  request: Request,
  fields: readonly Field[],
  limit: { bytes: number; words: string },
): Promise<Upload<Field>> {
  const upload: Omit<Upload<Field>, "formData"> = { files: {}, tooLarge: {} };
  const maxFileSize = Math.min(3 * limit.bytes, limit.bytes + MOST_ABOVE);
  try {
    const formData = await parseFormData(
      request,
      { maxFileSize, maxFiles: fields.length, maxParts: MOST_PARTS, maxTotalSize: (maxFileSize + 1) * fields.length },
      async (file) => {
        const field = fields.find((name) => name === file.fieldName);
        // A field that was left empty comes as a file without name and content.
        if (field === undefined || (file.name === "" && file.size === 0)) return;
        const name = safeFileName(file.name);
        if (file.size > limit.bytes) upload.tooLarge[field] = { name, size: file.size };
        else upload.files[field] = { name, bytes: await file.bytes() };
      },
    );
    for (const field of fields) formData.delete(field);
    return { ...upload, formData };
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
