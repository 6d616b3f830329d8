import { html, Markup } from "./escape-html.ts";
import type { Letter, LetterPart } from "./letter.ts";

/** By which the HTML names the mark that goes with every mail; nothing is fetched from anywhere. */
export const MARK_CID = "mark@planeward";

const FONT = "font-family:'Noto Sans',-apple-system,'Segoe UI',Roboto,Arial,sans-serif";

/** What styles on the elements cannot say. Readers that leave it out show the light one, which is whole by itself. */
const STYLE = new Markup(`
  a:focus, a:hover { text-decoration-thickness: 2px }
  @media (prefers-color-scheme: dark) {
    .page, .page h1, .page p, .page td, .page th, .page li { background-color: #12171e !important; color: #e9e6dd !important }
    .sheet, .sheet td, .sheet th, .sheet h1, .sheet p, .sheet li { background-color: #1a212b !important; color: #e9e6dd !important; border-color: #a9b2bd !important }
    .page .quiet { color: #a9b2bd !important }
    .page a { color: #e39a63 !important }
    .page .act { background-color: #e39a63 !important; border-color: #e39a63 !important; color: #12171e !important }
    .page .mind { border-color: #e0b04c !important }
  }`);

/** A letter as HTML for the readers of mail: tables, styles on the elements, nothing from outside, nothing that tells who has read it. */
export function letterHtml({ subject, parts, opening, foot }: Letter): string {
  const [first] = parts;
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width" />
        <meta name="color-scheme" content="light dark" />
        <meta name="supported-color-schemes" content="light dark" />
        <title>${subject}</title>
        <style>
          ${STYLE}
        </style>
      </head>
      <body
        class="page"
        style="margin:0;padding:0;background-color:#faf8f3;color:#1b2430;${FONT};font-size:16px;line-height:1.5"
      >
        <div style="display:none;max-height:0;overflow:hidden">${opening ?? first?.sentence ?? ""}</div>
        <table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0">
          <tr>
            <td align="center" style="padding:24px 12px">
              <table
                role="presentation"
                class="sheet"
                width="100%"
                cellpadding="0"
                cellspacing="0"
                border="0"
                style="max-width:600px;background-color:#ffffff;border:1px solid #1b2430;text-align:left"
              >
                <tr>
                  <td style="padding:12px 24px;border-bottom:1px solid #1b2430;${FONT};font-size:16px;font-weight:600">
                    <img src="cid:${MARK_CID}" width="24" height="24" alt="" style="vertical-align:middle;border:0" />
                    <span style="vertical-align:middle">Planeward</span>
                  </td>
                </tr>
                ${opening === null ? null : row(html`<p style="margin:0">${opening}</p>`)}
                ${parts.map((part) => row(partHtml(part)))}
                <tr>
                  <td class="quiet" style="padding:16px 24px;${FONT};font-size:14px;color:#4c5866">
                    <p class="quiet" style="margin:0">${foot.why}</p>
                    ${foot.links.map(
                      ({ words, address }) =>
                        html`<p style="margin:8px 0 0"><a href="${address}" style="color:#9a4f1c">${words}</a></p>`,
                    )}
                  </td>
                </tr>
              </table>
            </td>
          </tr>
        </table>
      </body>
    </html> `.text;
}

const row = (inside: Markup) =>
  html`<tr>
    <td style="padding:24px;border-bottom:1px solid #d8d3c8;${FONT};font-size:16px">${inside}</td>
  </tr> `;

function partHtml({ heading, sentence, facts, said, mind, link }: LetterPart): Markup {
  return html`<h1 style="margin:0;font-size:20px;line-height:1.3;font-weight:600;overflow-wrap:anywhere">${heading}</h1>
    <p style="margin:8px 0 0;overflow-wrap:anywhere">${sentence}</p>
    <table cellpadding="0" cellspacing="0" border="0" style="margin:16px 0 0">
      ${facts.map(
        ({ label, value }) =>
          html`<tr>
            <th
              scope="row"
              class="quiet"
              style="padding:2px 16px 2px 0;text-align:left;vertical-align:top;font-size:14px;font-weight:400;color:#4c5866"
            >
              ${label}
            </th>
            <td style="padding:2px 0;vertical-align:top;overflow-wrap:anywhere">${value}</td>
          </tr>`,
      )}
    </table>
    ${said && saidHtml(said)}
    ${mind === null ? null : html`<p class="mind" style="margin:16px 0 0;padding:8px 12px;border:1px solid #80570a;border-left-width:4px">${mind}</p>`}
    <p style="margin:20px 0 0">
      <a
        class="act"
        href="${link.address}"
        style="display:inline-block;padding:8px 16px;background-color:#9a4f1c;border:1px solid #9a4f1c;border-radius:3px;color:#ffffff;font-weight:600;text-decoration:none"
        >${link.words}</a
      >
    </p>`;
}

const saidHtml = ({ heading, lines }: NonNullable<LetterPart["said"]>) =>
  html`<p class="quiet" style="margin:16px 0 0;font-size:14px;color:#4c5866">${heading}</p>
    ${lines.map((line) => html`<p style="margin:4px 0 0;padding-left:12px;overflow-wrap:anywhere">${line}</p>`)}`;
