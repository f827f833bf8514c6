// Draws the figures of PlotChart. Plotly.Blazor loads plotly.js and makes each chart; from there on this module
// shows figures in it, keeps the user's zoom, follows the color scheme and reports what is pointed at.

import { clamp, placeLabels, sides } from './plot-labels.js';

const charts = new Map();

/** Waits for the chart that Plotly.Blazor makes, then listens to it. Fails where the library cannot be loaded. */
export async function open(id, frameId, dotNet) {
  const plot = document.getElementById(id);
  await made(plot);
  const chart = {
    plot, dotNet, frame: document.getElementById(frameId), tip: plot.closest('.plot-picture').querySelector('.plot-tip'),
    colors: new Map(), traces: [], figure: null, serial: 0, zoomed: null, due: null, drawn: Promise.resolve(),
    pointed: { kind: 0, index: -1 }, reporting: false, open: new AbortController(),
  };
  charts.set(id, chart);
  plot.on('plotly_relayout', e => {
    if (Object.keys(e).some(key => key.includes('axis.range'))) {
      chart.zoomed = rangesOf(plot);
      queue(chart, () => drawShapes(chart));
    }
  });
  plot.on('plotly_doubleclick', () => zoom(id, 0));
  const resizing = new ResizeObserver(() => { if (chart.figure) queue(chart, () => fit(chart)); });
  resizing.observe(plot);
  chart.open.signal.addEventListener('abort', () => resizing.disconnect());
  listenToPointer(chart);
  listenToKeys(chart, id);
}

export function close(id) {
  charts.get(id)?.open.abort();
  charts.delete(id);
}

/** Shows a figure. `change.traces` holds null for each trace that stays. */
export async function show(id, change) {
  const chart = charts.get(id);
  const before = chart.figure;
  const changed = change.traces.map((trace, i) => trace && i).filter(i => i !== null);
  const isSame = before && before.view === change.figure.view && change.traces.length === chart.traces.length
    && same([before.x, before.y], [change.figure.x, change.figure.y])
    && changed.every(i => same(looksOf(chart.traces[i]), looksOf(change.traces[i])));
  chart.serial = change.serial;
  chart.figure = change.figure;
  chart.traces = change.traces.map((trace, i) => trace ?? chart.traces[i]);
  if (before?.view !== chart.figure.view) chart.zoomed = null;
  chart.due ??= { whole: false, traces: new Set() };
  chart.due.whole ||= !isSame;
  changed.forEach(i => chart.due.traces.add(i));
  await queue(chart, () => catchUp(chart));
}

/** Draws what has changed since the last drawing: everything that hangs on no trace, then the traces that did. */
async function catchUp(chart) {
  const { due } = chart;
  chart.due = null;
  if (!due) return; // drawn together with an earlier figure
  if (due.whole) return draw(chart);
  await drawShapes(chart);
  if (due.traces.size > 0) {
    const traces = [...due.traces];
    await Plotly.animate(chart.plot, { data: traces.map(i => traceOf(chart, chart.traces[i])), traces },
      { mode: 'immediate', frame: { redraw: false, duration: 0 }, transition: { duration: 0 } });
  }
}

const same = (a, b) => JSON.stringify(a) === JSON.stringify(b);
const looksOf = ({ x, y, tips, ...looks }) => looks;

/** Zooms about the middle of the picture by a factor on each axis; 0 goes back to the first view. */
export function zoom(id, factor) {
  const chart = charts.get(id);
  if (factor === 0) {
    chart.zoomed = null;
    return queue(chart, () => draw(chart));
  }
  return zoomAt(chart, factor, [0.5, 0.5]);
}

export const download = (id, format, filename) => {
  const { plot } = charts.get(id);
  return Plotly.downloadImage(plot, { format, filename, width: plot.clientWidth, height: plot.clientHeight, scale: format === 'png' ? 2 : 1 });
};

function made(plot) {
  if (plot._fullLayout) return;
  const script = document.getElementById('plotly-import');
  return new Promise((resolve, reject) => {
    const fail = () => { script?.remove(); reject(new Error('The chart library could not be loaded.')); };
    const patience = setTimeout(fail, 20_000);
    // Plotly.Blazor's own listener was there first: when ours is called, it has made the chart.
    const check = () => { clearTimeout(patience); plot._fullLayout ? resolve() : fail(); };
    script.addEventListener('load', check);
    script.addEventListener('error', fail);
    if (window.Plotly) setTimeout(check);
  });
}

/** Runs drawing steps one after the other. */
function queue(chart, step) {
  chart.drawn = chart.drawn.catch(() => {}).then(() => charts.has(chart.plot.id) ? step() : undefined);
  return chart.drawn;
}

async function draw(chart) {
  await Plotly.react(chart.plot, chart.traces.map(trace => traceOf(chart, trace)), layoutOf(chart), config);
  useLocalClips(chart.plot);
  await drawShapes(chart); // labels are placed by the axes just drawn
  await fit(chart); // the page may have moved since the chart was made
}

/**
 * On a page with a base address plotly refers to its clip paths by the whole address, which ends to hold as soon as the page
 * changes its query: what was clipped then sticks out. A reference by name alone holds always.
 */
function useLocalClips(plot) {
  plot._context._baseUrl = '';
  for (const clipped of plot.querySelectorAll('[clip-path*="#"]')) {
    clipped.setAttribute('clip-path', clipped.getAttribute('clip-path').replace(/^url\(['"]?[^#]*(#[^'")]*)['"]?\)$/, "url('$1')"));
  }
}

const drawShapes = chart => Plotly.relayout(chart.plot, { shapes: shapesOf(chart) });

/** Makes the picture as large as its frame. */
async function fit(chart) {
  const { clientWidth: width, clientHeight: height, _fullLayout: drawn } = chart.plot;
  if (width === 0 || (Math.abs(width - drawn.width) < 1 && Math.abs(height - drawn.height) < 1)) return; // plotly keeps fractions of a pixel
  await Plotly.Plots.resize(chart.plot);
  await drawShapes(chart);
}

// --- color scheme

function repaint() {
  for (const chart of charts.values()) {
    chart.colors.clear();
    if (chart.figure) queue(chart, () => draw(chart));
  }
}

matchMedia('(prefers-color-scheme: dark)').addEventListener('change', repaint);
new MutationObserver(repaint).observe(document.documentElement, { attributes: true, attributeFilter: ['data-scheme'] });

// On paper everything is light.
let schemeOnScreen;
addEventListener('beforeprint', () => {
  schemeOnScreen = document.documentElement.dataset.scheme;
  document.documentElement.dataset.scheme = 'light';
});
addEventListener('afterprint', () => {
  if (schemeOnScreen) document.documentElement.dataset.scheme = schemeOnScreen;
  else delete document.documentElement.dataset.scheme;
});

/** The color of a custom property where the chart stands. */
function paint(chart, token) {
  if (!token) return 'rgba(0,0,0,0)';
  if (!chart.colors.has(token)) {
    const probe = chart.frame.appendChild(document.createElement('span'));
    probe.hidden = true;
    probe.style.color = `var(${token})`;
    chart.colors.set(token, getComputedStyle(probe).color);
    probe.remove();
  }
  return chart.colors.get(token);
}

// --- figures in plotly's terms

const isCoarse = () => matchMedia('(pointer: coarse)').matches;
const config = { displayModeBar: false, doubleClick: false }; // as PlotChart makes it: another one would make the chart anew

function traceOf(chart, trace) {
  const color = paint(chart, trace.color);
  const hasTips = trace.tips.length > 0;
  return {
    type: 'scatter',
    mode: [trace.width > 0 ? 'lines' : '', trace.mark !== 'None' ? 'markers' : ''].filter(Boolean).join('+') || 'none',
    // An empty trace would keep its old points.
    x: trace.x.length ? trace.x : [null],
    y: trace.y.length ? trace.y : [null],
    line: { color, width: trace.width, dash: trace.dash || 'solid' },
    marker: {
      symbol: trace.mark === 'Cross' ? 'x-thin' : 'circle', size: trace.size,
      color: trace.mark === 'Ring' ? paint(chart, '--pane') : color, line: { color, width: trace.mark === 'Disk' ? 0 : 1.5 },
    },
    hoverinfo: hasTips ? 'text' : 'skip',
    hovertemplate: hasTips ? '%{text}<extra></extra>' : '',
    text: hasTips ? trace.tips : '',
    showlegend: false,
  };
}

function layoutOf(chart) {
  const style = getComputedStyle(chart.frame);
  const size = sizeOf(style);
  const [ink, quiet, grid, line, pane] = ['--ink', '--ink-2', '--grid', '--line-strong', '--pane'].map(token => paint(chart, token));
  const ranges = chart.zoomed ?? [chart.figure.x, chart.figure.y].map(axis => [axis.from, axis.to]);
  const axis = (of, range, length) => ({
    title: { text: of.title, font: { size }, standoff: 6 }, range, tickformat: of.format || undefined, tickfont: { size }, nticks: clamp(Math.round(length), 3, 9),
    gridcolor: grid, linecolor: line, showline: true, zeroline: true, zerolinecolor: line, zerolinewidth: 1, ticks: 'outside', ticklen: 3, tickcolor: line, color: quiet, automargin: true,
  });
  return {
    xaxis: axis(chart.figure.x, ranges[0], chart.plot.clientWidth / 70), yaxis: axis(chart.figure.y, ranges[1], chart.plot.clientHeight / 40),
    font: { family: style.fontFamily, size, color: quiet }, paper_bgcolor: pane, plot_bgcolor: pane,
    margin: { l: 44, r: 8, t: 6, b: 32 }, showlegend: false, autosize: true,
    dragmode: chart.frame.tabIndex === 0 && !isCoarse() ? 'zoom' : false,
    hovermode: chart.traces.some(trace => trace.tips.length > 0) ? 'closest' : false,
    hoverlabel: { bgcolor: pane, bordercolor: line, font: { color: ink, size: size + 1 }, align: 'left' },
    shapes: [],
  };
}

const pointsOf = trace => trace.x.map((x, i) => [x, trace.y[i]]);
const corners = line => Array.from({ length: line.length / 2 }, (_, i) => [line[2 * i], line[2 * i + 1]]);
const pathOf = (line, isClosed) => corners(line).map(([x, y], i) => `${i ? 'L' : 'M'}${x},${y}`).join('') + (isClosed ? 'Z' : '');

function shapesOf(chart) {
  const { disks, guides, y: { from, to } } = chart.figure;
  const far = 20 * (to - from); // ends out of sight at any zoom; a line that hangs on the picture's edges would lie under the areas
  const paths = chart.figure.paths.filter(path => path.lines.length > 0);
  const pathShape = path => ({
    type: 'path', path: path.lines.map(line => pathOf(line, path.fill !== null)).join(''), layer: path.isBehind ? 'below' : 'above', opacity: path.opacity,
    line: { color: paint(chart, path.color), width: path.width, dash: path.dash || 'solid' }, fillcolor: paint(chart, path.fill),
  });
  return [
    ...paths.filter(path => path.isBehind).map(pathShape),
    ...guides.map(guide => ({
      type: 'line', x0: guide.x, x1: guide.x, y0: from - far, y1: to + far, layer: 'below',
      line: { color: paint(chart, '--line-strong'), width: 1, dash: guide.dash },
    })),
    ...paths.filter(path => !path.isBehind).map(pathShape),
    ...disks.map(disk => ({
      type: 'circle', xsizemode: 'pixel', ysizemode: 'pixel', xanchor: disk.x, yanchor: disk.y, x0: -disk.radius, x1: disk.radius, y0: -disk.radius, y1: disk.radius,
      fillcolor: paint(chart, disk.fill), line: { color: paint(chart, disk.color), width: disk.width },
    })),
    ...labelShapes(chart),
  ];
}

/** The labels of a figure as shapes: a box of the text's size, hung on the place where it covers least. */
function labelShapes(chart) {
  const { figure, traces, plot, frame } = chart;
  const { xaxis, yaxis } = plot._fullLayout;
  const style = getComputedStyle(frame);
  const size = sizeOf(style);
  const toPixel = ([x, y]) => [xaxis.d2p(x), yaxis.d2p(y)];
  const halo = paint(chart, '--pane');
  const placed = placeLabels({
    width: xaxis._length, height: yaxis._length, size, font: style.fontFamily,
    labels: figure.labels.map(label => ({
      lines: [label.title, ...label.notes], color: label.color, isBold: label.isBold,
      from: toPixel([label.x, label.y]), to: label.toX === null ? null : toPixel([label.toX, label.toY]),
    })),
    guides: figure.guides.filter(guide => guide.text).map(guide => ({ lines: [guide.text], color: '--ink-2', x: xaxis.d2p(guide.x) })),
    note: figure.note.length > 0 ? { lines: figure.note, color: '--ink-2' } : null,
    disks: figure.disks.map(disk => ({ at: toPixel([disk.x, disk.y]), radius: disk.radius })),
    lines: [
      ...figure.paths.filter(path => path.fill === null).map(path => ({ isMain: path.repelsLabels, lines: path.lines.map(line => corners(line).map(toPixel)) })),
      ...traces.filter(trace => trace.width > 0).map(trace => ({ isMain: true, lines: [pointsOf(trace).map(toPixel)] })),
    ],
    dots: traces.filter(trace => trace.mark !== 'None').flatMap(trace => pointsOf(trace).map(toPixel)),
  });
  return placed.map(({ x, y, w, h, lines, color, isBold }) => ({
    type: 'rect', xsizemode: 'pixel', ysizemode: 'pixel', xanchor: xaxis.p2d(x), yanchor: yaxis.p2d(y), x0: 0, x1: w, y0: 0, y1: -h, line: { width: 0 },
    label: {
      text: lines.map((line, i) => i === 0 && isBold ? `<b>${escape(line)}</b>` : escape(line)).join('<br>'), textposition: 'middle left', padding: 0,
      font: { size, color: paint(chart, color), shadow: `0 0 2px ${halo}, 0 0 2px ${halo}, 0 0 3px ${halo}, 0 0 3px ${halo}` },
    },
  }));
}

const sizeOf = style => parseFloat(style.getPropertyValue('--size-1')) || 11;
const escape = text => text.replace(/&/g, '&amp;').replace(/</g, '&lt;');

// --- pointer

function listenToPointer(chart) {
  const { plot } = chart;
  let down = null;
  plot.addEventListener('pointermove', e => { if (e.pointerType !== 'touch' && e.buttons === 0) point(chart, e); });
  plot.addEventListener('pointerleave', e => { if (e.pointerType !== 'touch') point(chart, null); });
  plot.addEventListener('pointerdown', e => { down = e.button === 0 ? [e.clientX, e.clientY] : null; }, true);
  // Plotly covers the page while the button is down, so the end of a click is heard at the window.
  window.addEventListener('pointerup', e => {
    const isClick = down && Math.hypot(e.clientX - down[0], e.clientY - down[1]) < 5;
    down = null;
    if (!isClick) return;
    point(chart, e);
    const { kind, index } = chart.pointed;
    if (index >= 0) chart.dotNet.invokeMethodAsync('OnPick', chart.serial, kind, index);
  }, { capture: true, signal: chart.open.signal });
  plot.addEventListener('wheel', e => {
    if (!(e.ctrlKey || e.metaKey) || chart.frame.tabIndex !== 0) return;
    e.preventDefault();
    const { xaxis, yaxis } = plot._fullLayout;
    const [x, y] = positionIn(chart, e);
    zoomAt(chart, e.deltaY < 0 ? 0.8 : 1.25, [clamp(x / xaxis._length, 0, 1), clamp(1 - y / yaxis._length, 0, 1)]);
  }, { passive: false });
}

function positionIn({ plot }, e) {
  const box = plot.getBoundingClientRect();
  const { l, t } = plot._fullLayout._size;
  return [e.clientX - box.left - l, e.clientY - box.top - t];
}

/** Finds what lies under the pointer, moves the tip there and tells the page where it has changed. */
function point(chart, e) {
  const { figure, traces, plot, tip } = chart;
  if (!figure) return;
  const found = e ? under(chart, positionIn(chart, e), e.pointerType === 'touch' ? 18 : 8) : { kind: 0, index: -1 };
  if (found.kind === chart.pointed.kind && found.index === chart.pointed.index) return;
  chart.pointed = found;
  plot.style.cursor = found.index < 0 ? '' : 'pointer';
  tip.toggleAttribute('data-open', false);
  if (found.index >= 0) {
    const { l, t } = plot._fullLayout._size;
    tip.style.left = `${found.at[0] + l}px`;
    tip.style.top = `${found.at[1] + t}px`;
    tip.toggleAttribute('data-left', found.at[0] > plot.clientWidth / 2);
    tip.toggleAttribute('data-up', found.at[1] > plot.clientHeight / 2);
  }
  report(chart);
}

/** One report is under way at a time; what has been passed over meanwhile is not reported. */
async function report(chart) {
  if (chart.reporting) return;
  chart.reporting = true;
  try {
    let told;
    while (told !== chart.pointed) {
      told = chart.pointed;
      await chart.dotNet.invokeMethodAsync('OnHover', chart.serial, told.kind, told.index);
    }
    chart.tip.toggleAttribute('data-open', told.index >= 0);
  } catch {
    // The connection is down: the page says so.
  } finally {
    chart.reporting = false;
  }
}

function under({ figure, traces, plot }, [px, py], reach) {
  const { xaxis, yaxis } = plot._fullLayout;
  const nothing = { kind: 0, index: -1 };
  if (px < 0 || py < 0 || px > xaxis._length || py > yaxis._length) return nothing;
  let best = { ...nothing, distance: reach };
  for (const trace of traces.filter(trace => trace.isPickable)) {
    trace.x.forEach((x, index) => {
      const at = [xaxis.d2p(x), yaxis.d2p(trace.y[index])];
      const distance = Math.hypot(at[0] - px, at[1] - py);
      if (distance < best.distance) best = { kind: 0, index, at, distance };
    });
  }
  // A dot within half the reach goes before the lines that end in it.
  if (best.index >= 0 && best.distance <= reach / 2) return best;
  for (const path of figure.paths) {
    path.picks.forEach((index, i) => {
      for (const [a, b] of sides(corners(path.lines[i]).map(([x, y]) => [xaxis.d2p(x), yaxis.d2p(y)]))) {
        const along = [b[0] - a[0], b[1] - a[1]];
        const at = clamp(((px - a[0]) * along[0] + (py - a[1]) * along[1]) / (along[0] ** 2 + along[1] ** 2 || 1), 0, 1);
        const distance = Math.hypot(a[0] + at * along[0] - px, a[1] + at * along[1] - py);
        if (distance < Math.min(best.distance, reach * 0.7)) best = { kind: 1, index, at: [px, py], distance };
      }
    });
  }
  return best;
}

// --- keys and zoom

function listenToKeys(chart, id) {
  chart.frame.addEventListener('keydown', e => {
    if (e.target !== chart.frame || chart.frame.tabIndex !== 0 || e.ctrlKey || e.metaKey || e.altKey) return;
    const shift = { ArrowLeft: [-0.15, 0], ArrowRight: [0.15, 0], ArrowUp: [0, 0.15], ArrowDown: [0, -0.15] }[e.key];
    if (shift) move(chart, ([from, to], i) => [from + shift[i] * (to - from), to + shift[i] * (to - from)]);
    else if (e.key === '+' || e.key === '=') zoom(id, 0.6);
    else if (e.key === '-') zoom(id, 1 / 0.6);
    else if (e.key === '0') zoom(id, 0);
    else return;
    e.preventDefault();
  });
}

const rangesOf = plot => [plot._fullLayout.xaxis.range.slice(), plot._fullLayout.yaxis.range.slice()];

/** Zooms about the place that lies `at` these shares of width and height from the lower left corner. */
const zoomAt = (chart, factor, at) =>
  move(chart, ([from, to], i) => [from + at[i] * (to - from) * (1 - factor), to - (1 - at[i]) * (to - from) * (1 - factor)]);

function move(chart, change) {
  return queue(chart, async () => {
    chart.zoomed = rangesOf(chart.plot).map(change);
    await Plotly.relayout(chart.plot, { 'xaxis.range': chart.zoomed[0], 'yaxis.range': chart.zoomed[1] });
  });
}
