import { otherFile } from "./other-files.ts";
import type { Encoding } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";

/** Bytes from which the encoding is told. */
const SNIFFED = 1024;
const WHAT_TO_DO = "Export it as CSV or text.";

/** Turns the bytes of a file into text, piece by piece. */
export interface TextDecoding {
  /** text of the bytes so far that was not given before */
  push(bytes: Uint8Array): string;
  end(): string;
  encoding(): Encoding;
}

/**
 * Decodes a file as it comes. UTF-8 and UTF-16 are told by the file; what is no UTF-8 is windows-1252 as long as nothing before
 * was read as a character of several bytes.
 * @param name the file's, for sentences
 * @param wanted an encoding that a person has stated
 * @throws ScanFileError for what is no text, is empty, or contradicts the stated encoding
 */
export function textDecoding(name: string, wanted?: Encoding): TextDecoding {
  let held: Uint8Array = new Uint8Array(0);
  let decode: ((bytes: Uint8Array, last: boolean) => string) | null = null;
  let encoding: Encoding = wanted ?? "utf-8";
  let before = 0;
  let sawSeveral = false;

  const utf8 = (bytes: Uint8Array, last: boolean): string => {
    const whole = last ? bytes.length : completeLength(bytes);
    held = bytes.slice(whole);
    const taken = bytes.subarray(0, whole);
    try {
      const text = new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(taken);
      sawSeveral ||= text.length !== taken.length;
      before += taken.length;
      return text;
    } catch {
      if (wanted === "utf-8") throw new ScanFileError(`${name} is not UTF-8 throughout. Choose another encoding.`);
      if (sawSeveral)
        throw new ScanFileError(
          `${name} begins as UTF-8 but is not UTF-8 any more after byte ${before}. Choose its encoding, or save it anew.`,
        );
      encoding = "windows-1252";
      decode = streamed("windows-1252");
      held = new Uint8Array(0);
      return decode(bytes, last);
    }
  };

  const begin = (bytes: Uint8Array) => {
    const other = otherFile(bytes);
    if (other) throw new ScanFileError(`${name} is ${other}, not a text file. ${WHAT_TO_DO}`);
    encoding = wanted ?? sniffed(bytes);
    decode = encoding === "utf-8" ? utf8 : streamed(encoding);
  };

  const take = (bytes: Uint8Array, last: boolean): string => {
    const all = held.length === 0 ? bytes : joined(held, bytes);
    held = new Uint8Array(0);
    if (!decode) {
      if (all.length < SNIFFED && !last) {
        held = all.slice();
        return "";
      }
      begin(all);
    }
    const text = decode?.(all, last) ?? "";
    if (text.includes("\0")) throw new ScanFileError(`${name} is not a text file. ${WHAT_TO_DO}`);
    return text;
  };

  let first = true;
  const withoutMark = (text: string): string => {
    if (!first || text === "") return text;
    first = false;
    return text.startsWith("\uFEFF") ? text.slice(1) : text;
  };
  return {
    push: (bytes) => withoutMark(take(bytes, false)),
    end: () => withoutMark(take(new Uint8Array(0), true)),
    encoding: () => encoding,
  };
}

function streamed(encoding: Encoding): (bytes: Uint8Array, last: boolean) => string {
  const decoder = new TextDecoder(encoding, { ignoreBOM: true });
  return (bytes, last) => decoder.decode(bytes, { stream: !last });
}

/** UTF-16 writes every second byte of plain text as zero; a byte order mark settles it before that. */
function sniffed(bytes: Uint8Array): Encoding {
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return "utf-16le";
  if (first === 0xfe && second === 0xff) return "utf-16be";
  const zeros = [0, 0];
  const looked = Math.min(bytes.length, SNIFFED);
  for (let n = 0; n < looked; n += 1) if (bytes[n] === 0) zeros[n % 2] = (zeros[n % 2] ?? 0) + 1;
  const [even = 0, odd = 0] = zeros;
  const most = looked / 2;
  if (odd > 0.6 * most && even === 0) return "utf-16le";
  if (even > 0.6 * most && odd === 0) return "utf-16be";
  return "utf-8";
}

/** Length without the bytes of a last character that goes on in the next piece. */
function completeLength(bytes: Uint8Array): number {
  for (let back = 1; back <= Math.min(3, bytes.length); back += 1) {
    const byte = bytes[bytes.length - back] ?? 0;
    if (byte < 0x80) break;
    if (byte >= 0xc0) return (byte >= 0xf0 ? 4 : byte >= 0xe0 ? 3 : 2) > back ? bytes.length - back : bytes.length;
  }
  return bytes.length;
}

function joined(first: Uint8Array, second: Uint8Array): Uint8Array {
  const both = new Uint8Array(first.length + second.length);
  both.set(first);
  both.set(second, first.length);
  return both;
}

/**
 * The whole text of a small file, lines ended by a line feed.
 * @throws ScanFileError for what is no text, or empty
 */
export function fileText(bytes: Uint8Array, name: string): string {
  if (bytes.length === 0) throw new ScanFileError(emptySentence(name));
  const decoding = textDecoding(name);
  const text = decoding.push(bytes) + decoding.end();
  if (text.trim() === "") throw new ScanFileError(blankSentence(name));
  return text.replace(/\r\n?/g, "\n");
}

export const emptySentence = (name: string) => `${name} is empty. Choose the file that the instrument wrote.`;
export const blankSentence = (name: string) =>
  `${name} holds nothing but blanks. Choose the file that the instrument wrote.`;
