import { readFile } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import type { Browser } from "@playwright/test";
import jsQR from "jsqr";
import type * as Pdf from "pdfjs-dist";

const HOST = "http://paper.example";
const SCALE = 2;
const library = (name: string) =>
  fileURLToPath(new URL(`../../node_modules/pdfjs-dist/legacy/build/${name}`, import.meta.url));

/** What a page of a printed PDF says: its words, and what the code on it reads as; null where there is none. */
export interface PrintedPage {
  text: string;
  code: string | null;
}

/** Sets a PDF as a printer would, in the browser, and reads it as eyes and a phone do. */
export async function readPrinted(browser: Browser, file: string): Promise<PrintedPage[]> {
  const pdf = (await readFile(file)).toString("base64");
  const context = await browser.newContext({ serviceWorkers: "block" });
  try {
    const page = await context.newPage();
    await page.route(`${HOST}/**`, async (route) => {
      const name = new URL(route.request().url()).pathname.slice(1);
      if (name === "") await route.fulfill({ contentType: "text/html", body: "<!doctype html><title>paper</title>" });
      else await route.fulfill({ contentType: "text/javascript", body: await readFile(library(name)) });
    });
    await page.goto(HOST);
    const pages = await page.evaluate(setInBrowser, { pdf, host: HOST, scale: SCALE });
    return pages.map(({ text, width, height, pixels }) => {
      const read = jsQR(new Uint8ClampedArray(Buffer.from(pixels, "base64")), width, height);
      return { text, code: read ? read.data : null };
    });
  } finally {
    await context.close();
  }
}

interface Asked {
  pdf: string;
  host: string;
  scale: number;
}

/** Runs in the browser: the words of each page and its picture, as bytes red, green, blue, alpha in base64. */
async function setInBrowser({ pdf, host, scale }: Asked) {
  const { getDocument, GlobalWorkerOptions } = (await import(`${host}/pdf.mjs`)) as typeof Pdf;
  GlobalWorkerOptions.workerSrc = `${host}/pdf.worker.mjs`;
  const data = Uint8Array.from(atob(pdf), (letter) => letter.charCodeAt(0));
  const document_ = await getDocument({ data, verbosity: 0 }).promise;
  const pages = [];
  for (let number = 1; number <= document_.numPages; number += 1) {
    const page = await document_.getPage(number);
    const { items } = await page.getTextContent();
    const viewport = page.getViewport({ scale });
    const canvas = Object.assign(document.createElement("canvas"), {
      width: Math.ceil(viewport.width),
      height: Math.ceil(viewport.height),
    });
    const drawing = canvas.getContext("2d");
    if (!drawing) throw new Error("This browser draws nothing.");
    await page.render({ canvas, canvasContext: drawing, viewport }).promise;
    const { data: bytes, width, height } = drawing.getImageData(0, 0, canvas.width, canvas.height);
    let letters = "";
    for (let at = 0; at < bytes.length; at += 32768) letters += String.fromCharCode(...bytes.subarray(at, at + 32768));
    pages.push({
      text: items.map((item) => ("str" in item ? item.str : "")).join(" "),
      width,
      height,
      pixels: btoa(letters),
    });
  }
  return pages;
}
