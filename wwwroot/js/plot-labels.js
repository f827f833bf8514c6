// Puts the labels of a chart where they cover least. All lengths are pixels from the upper left corner of the plot area.

const gap = 9; // from an anchor to its label
const leading = 1.3;

/**
 * Places labels one after the other, the most important first; one whose anchor is out of sight is left out.
 * A label belongs to a point (`from`) or to the seen part of a line (`from`, `to`); a guide's stands at the top of its line; the note takes a corner.
 */
export function placeLabels({ width, height, size, font, labels, guides, note, disks, lines, dots }) {
  const bounds = { x: 2, y: 2, w: width - 4, h: height - 4 };
  const obstacles = {
    boxes: disks.map(({ at: [x, y], radius: r }) => ({ x: x - r, y: y - r, w: 2 * r, h: 2 * r })),
    lines: lines.flatMap(({ isMain, lines: all }) => all.flatMap(sides).map(ends => ({ ends, weight: isMain ? 40 : 2 }))),
    dotsIn: counterOf(dots, width, height),
  };
  const placed = [];
  const put = (label, candidates) => {
    // A little room: text in a picture is not set as the canvas measures it.
    const w = Math.max(...label.lines.map((line, i) => widthOf(line, `${label.isBold && i === 0 ? 700 : 400} ${size}px ${font}`))) * 1.03 + 2;
    const h = label.lines.length * size * leading;
    const best = candidates(w, h)
      .map(({ x, y, cost = 0 }) => ({ x, y, w, h, cost: cost + costOf({ x, y, w, h }, bounds, obstacles) }))
      .reduce((least, box) => box.cost < least.cost ? box : least);
    obstacles.boxes.push(best);
    placed.push({ ...label, ...best });
  };
  for (const guide of guides.filter(({ x }) => x >= bounds.x && x <= bounds.w)) {
    put(guide, (w, h) => besideTop(guide.x, w, h));
  }
  for (const label of labels) {
    const seen = label.to ? clip(label.from, label.to, bounds) : null;
    if (seen) put(label, (w, h) => along(seen, w, h));
    else if (!label.to && isIn(label.from, bounds)) put(label, (w, h) => around(label.from, w, h));
  }
  if (note) put(note, (w, h) => inCorners(bounds, w, h));
  return placed;
}

const besideTop = (x, w, h) => [2, 4 + h].flatMap((y, row) => [{ x: x + 3, y, cost: 2 * row }, { x: x - w - 3, y, cost: 2 * row }]);

const inCorners = ({ x, y, w: width, h: height }, w, h) => {
  const [left, right, top, bottom] = [x + 4, x + width - w - 4, y + 2, y + height - h - 4];
  return [{ x: right, y: bottom }, { x: right, y: top, cost: 8 }, { x: left, y: bottom, cost: 8 }, { x: left, y: top, cost: 8 }];
};

const around = ([x, y], w, h) => [1, 2.2, 4].flatMap((far, ring) => {
  const d = gap * far;
  const near = d * 0.7;
  return [[d, -h / 2], [-d - w, -h / 2], [-w / 2, -d - h], [-w / 2, d], [near, near], [near, -near - h], [-near - w, near], [-near - w, -near - h]]
    .map(([dx, dy], turn) => ({ x: x + dx, y: y + dy, cost: ring * 6 + turn * 0.1 }));
});

const along = ([[x0, y0], [x1, y1]], w, h) => [0.5, 0.4, 0.6, 0.3, 0.7, 0.2, 0.8].flatMap(at => {
  const [x, y] = [x0 + at * (x1 - x0), y0 + at * (y1 - y0)];
  return [1, 2, 4].flatMap(far => [y + gap * far, y - gap * far - h].map(top => ({ x: x - w / 2, y: top, cost: far * 1.5 + 4 * Math.abs(at - 0.5) })));
});

/** What a label would cover: the edge of the picture most, other labels nearly as much, then the lines it must not cross, then dots. */
function costOf(box, bounds, { boxes, lines, dotsIn }) {
  const around = { x: box.x - 2, y: box.y - 2, w: box.w + 4, h: box.h + 4 };
  return (box.w * box.h - overlap(box, bounds)) * 10
    + boxes.reduce((sum, other) => sum + overlap(box, other) * 4, 0)
    + lines.reduce((sum, { ends: [from, to], weight }) => sum + (mayMeet(from, to, around) && clip(from, to, around) ? weight : 0), 0)
    + dotsIn(box) * 1.5;
}

const cell = 8;

/** Counts dots once into cells, so that those in a box are a sum over a few cells instead of a look at every dot. */
function counterOf(dots, width, height) {
  const [columns, rows] = [Math.ceil(width / cell), Math.ceil(height / cell)];
  const counts = new Uint16Array(columns * rows);
  for (const [x, y] of dots) {
    if (x >= 0 && y >= 0 && x < width && y < height) counts[Math.floor(y / cell) * columns + Math.floor(x / cell)]++;
  }
  const index = (length, most) => clamp(Math.floor(length / cell), 0, most - 1);
  return ({ x, y, w, h }) => {
    let sum = 0;
    for (let row = index(y, rows); row <= index(y + h, rows); row++) {
      for (let column = index(x, columns); column <= index(x + w, columns); column++) sum += counts[row * columns + column];
    }
    return sum;
  };
}

export const clamp = (value, least, most) => Math.min(Math.max(value, least), most);
export const sides = points => points.slice(1).map((point, i) => [points[i], point]);
const isIn = ([x, y], box) => x >= box.x && x <= box.x + box.w && y >= box.y && y <= box.y + box.h;
const overlap = (a, b) => Math.max(0, Math.min(a.x + a.w, b.x + b.w) - Math.max(a.x, b.x)) * Math.max(0, Math.min(a.y + a.h, b.y + b.h) - Math.max(a.y, b.y));

const mayMeet = ([x0, y0], [x1, y1], { x, y, w, h }) =>
  Math.max(x0, x1) >= x && Math.min(x0, x1) <= x + w && Math.max(y0, y1) >= y && Math.min(y0, y1) <= y + h;

/** The part of a segment inside a box, by the method of Liang and Barsky; null where none is. */
function clip([x0, y0], [x1, y1], box) {
  const [dx, dy] = [x1 - x0, y1 - y0];
  let [from, to] = [0, 1];
  for (const [p, q] of [[-dx, x0 - box.x], [dx, box.x + box.w - x0], [-dy, y0 - box.y], [dy, box.y + box.h - y0]]) {
    if (p === 0 && q < 0) return null;
    if (p < 0) from = Math.max(from, q / p);
    if (p > 0) to = Math.min(to, q / p);
  }
  return from < to ? [[x0 + from * dx, y0 + from * dy], [x0 + to * dx, y0 + to * dy]] : null;
}

const canvas = document.createElement('canvas').getContext('2d');
const widths = new Map();
const mostWidths = 2000;

function widthOf(text, font) {
  const key = font + text;
  if (!widths.has(key)) {
    if (widths.size >= mostWidths) widths.clear();
    canvas.font = font;
    widths.set(key, canvas.measureText(text).width);
  }
  return widths.get(key);
}
