import { ACTION, INK, MUTED } from "../colours";
import { stacked, type Block } from "../flow";
import type { Context } from "../options";
import type { Sheet, Style } from "../sheet";
import { ascent, CODE, FINE, leading, SUBTITLE, TITLE } from "../styles";
import { drawQrCode } from "../svg/qrCode";
import { paragraph } from "../text";
import { wrap } from "../type/wrap";

export const TITLE_WORDS = "Duct traverse certificate";

const MARK = 30;
const QR = 62;
const VERIFY = 138;

/** The mark, what this is and of what, and where it can be verified. */
export function head(context: Context): Block {
  const { sheet, document, options } = context;
  const { system, location, id, revision, supersedes } = document;
  const room = sheet.width - MARK - 12 - VERIFY - QR - 18;
  const title = stacked([
    paragraph(sheet, TITLE_WORDS, TITLE, room, "H1"),
    paragraph(sheet, [system, location].filter(Boolean).join(", ") || "System not named", SUBTITLE, room),
    { height: 3, draw: () => {} },
    paragraph(sheet, `Record ${id}`, CODE, room),
    paragraph(sheet, `Revision ${revision}${supersedes ? `, replaces ${supersedes}` : ", first issue"}`, CODE, room),
  ]);
  const verify = stacked([
    paragraph(sheet, "Verify this record", { face: "strong", size: 7.6, colour: INK }, VERIFY),
    address(sheet, options.verifyUrl, VERIFY),
    { height: 2, draw: () => {} },
    paragraph(sheet, `Signed with key ${options.signingKeyId}`, { ...FINE, colour: MUTED }, VERIFY),
  ]);
  return {
    height: Math.max(title.height, verify.height + 4, QR),
    draw: (x, y) => {
      sheet.artifact(() => drawMark(sheet, x, y + 2, MARK));
      title.draw(x + MARK + 12, y);
      const right = x + sheet.width;
      verify.draw(right - QR - 10 - VERIFY, y + 4);
      sheet.tagged("Figure", () => drawQrCode(sheet, options.verifyUrl, right - QR, y, QR), { alt: `QR code of ${options.verifyUrl}`, bbox: [right - QR, y, right, y + QR] });
    },
  };
}

/** An address as text that can also be followed. */
function address(sheet: Sheet, url: string, width: number): Block {
  const style: Style = { ...CODE, size: 6.2, colour: ACTION };
  const lines = wrap(sheet, url, style, width);
  const height = lines.length * leading(style);
  return {
    height,
    draw: (x, y) =>
      sheet.within("Link", () => {
        sheet.content(() => lines.forEach((line, index) => sheet.write(line, x, y + ascent(style) + index * leading(style), style)));
        sheet.link(x, y, width, height, url, "Verify this record");
      }),
  };
}

/** A duct's cross-section with nine points, the middle one open. */
function drawMark({ doc }: Sheet, x: number, y: number, side: number): void {
  doc.roundedRect(x + 0.8, y + 0.8, side - 1.6, side - 1.6, side * 0.14).lineWidth(1.6).strokeColor(ACTION).stroke();
  for (const row of [-1, 0, 1]) {
    for (const column of [-1, 0, 1]) {
      doc.circle(x + side * (0.5 + 0.25 * column), y + side * (0.5 + 0.25 * row), side * 0.065);
      if (row === 0 && column === 0) doc.lineWidth(1).stroke();
      else doc.fill(ACTION);
    }
  }
}
