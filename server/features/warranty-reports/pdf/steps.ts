/** A point on paper. */
export type Point = readonly [number, number];

/** A line that keeps its height up to the next point and steps there. */
export function steps(points: readonly Point[]): Point[] {
  const line: Point[] = [];
  for (const [x, y] of points) {
    const last = line.at(-1);
    if (last) line.push([x, last[1]]);
    line.push([x, y]);
  }
  return line;
}

/** Draws a line through points, or closes it to an area. */
export function trace(doc: PDFKit.PDFDocument, points: readonly Point[]): PDFKit.PDFDocument {
  points.forEach(([x, y], index) => (index === 0 ? doc.moveTo(x, y) : doc.lineTo(x, y)));
  return doc;
}
