interface Point {
  x: number;
  y: number;
}

interface Box {
  x0: number;
  x1: number;
  y0: number;
  y1: number;
}

/** Height of a label, px, and the width of one of its characters. */
const HEIGHT = 13;
const CHARACTER = 6.6;

const overlaps = (a: Box, b: Box): boolean => a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;

const around = ({ x, y }: Point, width: number, height: number): Box => ({
  x0: x - width / 2,
  x1: x + width / 2,
  y0: y - height / 2,
  y1: y + height / 2,
});

/** What of a picture is taken already, so that its labels cover neither marks nor each other. */
export class LabelRoom {
  private readonly taken: Box[] = [];

  constructor(private readonly bounds: { width: number; height: number }) {}

  /** Keep labels off a mark. */
  take(mark: Point, width: number, height: number): void {
    this.taken.push(around(mark, width, height));
  }

  /**
   * Take the first of some places that is free for a text of one line.
   *
   * @param places centres of the text, in the order of preference.
   * @returns the middle of its baseline; null where none is free.
   */
  place(text: string, places: Iterable<Point>): Point | null {
    const width = text.length * CHARACTER + 4;
    for (const centre of places) {
      const box = around(centre, width, HEIGHT);
      const isInside = box.x0 > 0 && box.x1 < this.bounds.width && box.y0 > 0 && box.y1 < this.bounds.height;
      if (isInside && !this.taken.some((other) => overlaps(box, other))) {
        this.taken.push(box);
        return { x: centre.x, y: centre.y + HEIGHT * 0.36 };
      }
    }
    return null;
  }
}
