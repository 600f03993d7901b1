/** Fills a bar with lines at 45°, cut at its edges, and outlines it: what is not there yet is not solid. */
export function hatched(
  doc: PDFKit.PDFDocument,
  [x, y, width, height]: readonly [number, number, number, number],
  colour: string,
): void {
  if (width <= 0) return;
  doc.save();
  doc.rect(x, y, width, height).clip();
  doc.lineWidth(0.9).undash();
  for (let at = x - height; at < x + width; at += 4) {
    doc.moveTo(at, y + height).lineTo(at + height, y);
  }
  doc.stroke(colour);
  doc.restore();
  doc.lineWidth(0.8).rect(x, y, width, height).stroke(colour);
}
