import { ACTION, MUTED, RULE, RUST } from "./colours";
import type { Context } from "./options";
import { MARGIN, type Style } from "./sheet";
import { standings } from "./sections/standing";
import { TITLE_WORDS } from "./sections/head";

const HEAD: Style = { face: "text", size: 7, colour: MUTED };

/** Height that the running head takes of each page after the first. */
export const RUNNING_HEAD = 22;

/** Running heads and page numbers, once all pages are there. */
export function numberPages({ sheet, document, options }: Context): void {
  const { doc } = sheet;
  const { count } = doc.bufferedPageRange();
  const standing = standings(document, options).map(({ word }) => word.toUpperCase()).join(", ");
  for (let page = 0; page < count; page += 1) {
    doc.switchToPage(page);
    const right = sheet.left + sheet.width;
    sheet.artifact(() => {
      if (page > 0) {
        const y = MARGIN.top + 6;
        sheet.write(standing ? `${TITLE_WORDS}, ${standing}` : TITLE_WORDS, sheet.left, y, { ...HEAD, face: "strong", colour: standing ? RUST : ACTION });
        sheet.write(`Record ${document.id}, revision ${document.revision}`, right, y, { ...HEAD, face: "figures", size: 6.6 }, "right");
        doc.moveTo(sheet.left, y + 5).lineTo(right, y + 5).lineWidth(0.5).strokeColor(RULE).stroke();
      }
      const foot = sheet.bottom + 14;
      sheet.write(`Averduct, engine ${document.engineVersion}. Figures are as signed; verify them before relying on a copy.`, sheet.left, foot, { ...HEAD, size: 6.4 });
      sheet.write(`page ${page + 1} of ${count}`, right, foot, { ...HEAD, face: "strong" }, "right");
    }, "Pagination");
  }
}
