import QRCode from "qrcode";
import { INK, WHITE } from "../colours";
import type { Sheet } from "../sheet";

/** Modules of light that a reader needs round the code. @see ISO/IEC 18004, 6.3.8 (from memory) */
const QUIET = 4;

/** Draws a QR code (ISO/IEC 18004) in a square with its quiet zone, as one surface. */
export function drawQrCode(sheet: Sheet, words: string, x: number, y: number, side: number): void {
  const { modules } = QRCode.create(words, { errorCorrectionLevel: "M" });
  const step = side / (modules.size + 2 * QUIET);
  sheet.doc.rect(x, y, side, side).fill(WHITE);
  for (let row = 0; row < modules.size; row += 1) {
    for (let column = 0; column < modules.size; column += 1) {
      if (modules.get(row, column)) sheet.doc.rect(x + (column + QUIET) * step, y + (row + QUIET) * step, step, step);
    }
  }
  sheet.doc.fill(INK);
}
