import { lotSchema } from "#app/schemas/lot-form.ts";
import { fileSize } from "#app/lib/file-size.ts";
import { fileText } from "#app/lib/scan-reading/decoding.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { readUpload, type Upload } from "#app/server/upload.server.ts";
import { keepLot, lotPage, tryLot, type LotRefused, type LotTrial } from "./lot.server.ts";

/** A list of 25 wafers has about a kilobyte. */
const LARGEST = { bytes: 64 * 1024, words: "64\u00A0kB" };
const FIELDS = ["name", "bow", "thickness", "warp", "edgeChips", "identity", "wafers"] as const;

/** What the page shows after a lot's form was sent: everything typed, and an answer or what is wrong. */
export interface LotFormAnswer {
  /** changes with every answer */
  sent: number;
  typed: Partial<Record<(typeof FIELDS)[number], string>>;
  lastResult: ReturnType<ReturnType<typeof parseForm<typeof lotSchema>>["reply"]> | null;
  trial: LotTrial | null;
  refused: { step: number | null; reason: string } | null;
}

/** Answers the form of a lot: tries it, or keeps it and says where it is. A file takes the place of the list. */
export async function answerLotForm(
  request: Request,
  scope: ActorScope,
  assessmentId: string | undefined,
): Promise<{ path: string } | { body: LotFormAnswer; status: number }> {
  // Who may not see the assessment is told so before anything is read.
  await lotPage(scope, assessmentId);
  const upload = await readUpload(request, ["file"], LARGEST);
  const { formData } = upload;
  const fileFault = takeFile(upload);
  const submission = parseForm(formData, lotSchema);
  const answer: LotFormAnswer = {
    sent: Date.now(),
    typed: typedOf(formData),
    lastResult: null,
    trial: null,
    refused: null,
  };
  if (submission.status !== "success" || fileFault !== null) {
    const lastResult = submission.reply(fileFault === null ? {} : { fieldErrors: { file: [fileFault] } });
    return { body: { ...answer, lastResult }, status: upload.tooLarge.file ? 413 : 400 };
  }
  const refuse = (refused: LotRefused) =>
    refused.outcome === "refused"
      ? {
          body: { ...answer, lastResult: submission.reply({ fieldErrors: { [refused.field]: [refused.reason] } }) },
          status: 400,
        }
      : { body: { ...answer, refused }, status: 409 };
  if (formData.get("intent") === "keep") {
    const kept = await keepLot(scope, assessmentId, submission.value);
    return kept.outcome === "stored" ? { path: `/assessments/${kept.id}` } : refuse(kept);
  }
  const trial = await tryLot(scope, assessmentId, submission.value);
  return trial.outcome === "computed" ? { body: { ...answer, trial }, status: 200 } : refuse(trial);
}

/** Puts a file's text in place of the list; what is wrong with the file, or null. */
function takeFile({ formData, files, tooLarge }: Upload<"file">): string | null {
  if (tooLarge.file)
    return `${tooLarge.file.name} has ${fileSize(tooLarge.file.size)}; a list of wafers may have up to ${LARGEST.words}.`;
  if (!files.file) return null;
  const { name, bytes } = files.file;
  try {
    formData.set("wafers", fileText(bytes, name));
    return null;
  } catch (error) {
    if (!(error instanceof ScanFileError)) throw error;
    return `${name} is empty, or no text file. Export slot, bow and thickness as CSV.`;
  }
}

function typedOf(formData: FormData): LotFormAnswer["typed"] {
  const typed: LotFormAnswer["typed"] = {};
  for (const name of FIELDS) {
    const value = formData.get(name);
    if (typeof value === "string") typed[name] = value.replaceAll("\0", "");
  }
  return typed;
}
