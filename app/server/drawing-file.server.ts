import { attachment } from "#app/lib/content-disposition.ts";

/** A drawing as the answer to a request for a file. @param name of the file, without its ending */
export const drawingFile = ({ name, svg }: { name: string; svg: string }) =>
  new Response(svg, {
    headers: {
      "Content-Type": "image/svg+xml; charset=utf-8",
      "Content-Disposition": attachment(`${name}.svg`),
      "Cache-Control": "no-store",
    },
  });
