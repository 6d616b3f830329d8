/** Twice the pixels of the drawing: sharp in a report. */
const SCALE = 2;

/**
 * Draws an SVG file of this server onto a canvas and has the browser save it as a PNG.
 * @param name of the file, without its ending
 * @throws when the drawing did not come or the picture could not be made
 */
export async function saveAsPicture(address: string, name: string): Promise<void> {
  const image = new Image();
  image.src = address;
  await image.decode();
  const canvas = document.createElement("canvas");
  canvas.width = image.naturalWidth * SCALE;
  canvas.height = image.naturalHeight * SCALE;
  const context = canvas.getContext("2d");
  if (!context) throw new Error("no canvas");
  context.drawImage(image, 0, 0, canvas.width, canvas.height);
  const picture = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, "image/png"));
  if (!picture) throw new Error("no picture");
  const link = document.createElement("a");
  link.href = URL.createObjectURL(picture);
  link.download = `${name}.png`;
  link.click();
  URL.revokeObjectURL(link.href);
}
