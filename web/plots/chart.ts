import uPlot from 'uplot';
import { SeenWork } from '../state/idle-work';

/** One line of a chart. */
export interface Line {
  name: string;
  values: ArrayLike<number | null>;
  /** Name of a colour of the page, such as "--pump". */
  colour: string;
  dash?: number[];
  width?: number;
  /** How the reading is written. */
  write: (value: number | null) => string;
}

/** A place on the horizontal axis worth marking. */
interface Mark {
  x: number;
  colour: string;
  dash?: number[];
}

/** What is drawn besides the lines; looked up at each drawing, so that a change needs no new chart. */
export interface Dressing {
  marks: Mark[];
  /** Span of the horizontal axis, hatched softly: a band. */
  span?: { from: number; to: number; colour: string };
  /** Span of the vertical axis, filled softly: where something holds. */
  shelf?: { from: number; to: number; colour: string };
  yRange?: [number, number];
}

/** Everything a chart on the page shows. */
export interface ChartContent {
  name: string;
  /** What the curve shows, in a sentence, for those who do not see it. */
  summary: string;
  xName: string;
  x: ArrayLike<number>;
  xWrite: (value: number) => string;
  xTick: (value: number) => string;
  yTick: (value: number) => string;
  lines: Line[];
  dressing?: Dressing;
  height?: number;
  /** Charts with the same key share their cursor. */
  sync?: string;
  /** Where the reading stands while nothing is pointed at. */
  rest: number;
}

/** Where a key press moves the reading, or null where the key means nothing here. */
export function readingStep(event: KeyboardEvent, index: number, count: number): number | null {
  const step = event.shiftKey ? 10 : 1;
  const targets: Record<string, number> = {
    ArrowRight: index + step,
    ArrowUp: index + step,
    ArrowLeft: index - step,
    ArrowDown: index - step,
    Home: 0,
    End: count - 1,
  };
  const to = targets[event.key];
  return to === undefined ? null : Math.max(0, Math.min(count - 1, to));
}

const colourOf = (name: string) => getComputedStyle(document.documentElement).getPropertyValue(name).trim();

function fill(
  chart: uPlot,
  left: number,
  top: number,
  right: number,
  bottom: number,
  colour: string,
  alpha: number,
): void {
  const { ctx, bbox } = chart;
  const x = Math.max(bbox.left, left);
  const y = Math.max(bbox.top, top);
  ctx.save();
  ctx.globalAlpha = alpha;
  ctx.fillStyle = colour;
  ctx.fillRect(
    x,
    y,
    Math.min(bbox.left + bbox.width, right) - x,
    Math.min(bbox.top + bbox.height, bottom) - y,
  );
  ctx.restore();
}

function dress(chart: uPlot, { marks, span, shelf }: Dressing): void {
  const { ctx, bbox } = chart;
  if (shelf) {
    const [top, bottom] = [chart.valToPos(shelf.to, 'y', true), chart.valToPos(shelf.from, 'y', true)];
    fill(chart, bbox.left, top, bbox.left + bbox.width, bottom, colourOf(shelf.colour), 0.16);
  }
  if (span)
    fill(
      chart,
      chart.valToPos(span.from, 'x', true),
      bbox.top,
      chart.valToPos(span.to, 'x', true),
      bbox.top + bbox.height,
      colourOf(span.colour),
      0.14,
    );
  for (const mark of marks) {
    const x = chart.valToPos(mark.x, 'x', true);
    if (x < bbox.left || x > bbox.left + bbox.width) continue;
    ctx.save();
    ctx.strokeStyle = colourOf(mark.colour);
    ctx.lineWidth = 2 * devicePixelRatio;
    ctx.setLineDash((mark.dash ?? []).map((piece) => piece * devicePixelRatio));
    ctx.beginPath();
    ctx.moveTo(x, bbox.top);
    ctx.lineTo(x, bbox.top + bbox.height);
    ctx.stroke();
    ctx.restore();
  }
}

interface ChartOrder {
  lines: Line[];
  xTick: (value: number) => string;
  yTick: (value: number) => string;
  height: number;
  /** Charts with the same key share their cursor. */
  sync?: string;
  /** Told the index under the cursor, null where there is none. */
  pointed: (index: number | null) => void;
}

/** Charts that share their cursor, by the key they share. */
const groups = new Map<string, Set<ChartHandle>>();

/** A chart in its box: made once per list of lines, then fed with new numbers; it follows the width of the box. */
export class ChartHandle {
  private readonly chart: uPlot;
  private readonly watcher: ResizeObserver;
  private readonly work: SeenWork;
  private dressing: Dressing = { marks: [] };

  constructor(
    private readonly order: ChartOrder,
    box: HTMLElement,
  ) {
    const width = () => Math.max(120, box.clientWidth);
    const none = order.lines.map(() => []);
    this.chart = new uPlot(this.options(width()), [[], ...none], box);
    this.watcher = new ResizeObserver(() => this.chart.setSize({ width: width(), height: order.height }));
    this.watcher.observe(box);
    this.work = new SeenWork(box);
    if (order.sync) groups.set(order.sync, (groups.get(order.sync) ?? new Set<ChartHandle>()).add(this));
  }

  show(x: ArrayLike<number>, lines: Line[], dressing: Dressing): void {
    this.work.do(() => {
      this.dressing = dressing;
      this.chart.setData([Array.from(x), ...lines.map((line) => Array.from(line.values))]);
    });
  }

  /** Puts the cursor on a point, in every chart of the group; null takes it away. */
  point(index: number | null): void {
    const group = this.order.sync ? (groups.get(this.order.sync) ?? []) : [this];
    for (const member of group) member.mark(index);
  }

  private mark(index: number | null): void {
    const left = index === null ? -10 : this.chart.valToPos(this.chart.data[0][index] ?? 0, 'x');
    this.chart.setCursor({ left, top: index === null ? -10 : 1 });
  }

  destroy(): void {
    if (this.order.sync) groups.get(this.order.sync)?.delete(this);
    this.work.end();
    this.watcher.disconnect();
    this.chart.destroy();
  }

  private options(width: number): uPlot.Options {
    const { order } = this;
    const axis = (write: (value: number) => string, size: number): uPlot.Axis => ({
      stroke: () => colourOf('--soft'),
      font: `12px ${colourOf('--label')}`,
      grid: { stroke: () => colourOf('--grid'), width: 1 },
      ticks: { stroke: () => colourOf('--rule'), width: 1, size: 4 },
      size,
      values: (_, splits) => splits.map(write),
    });
    return {
      width,
      height: order.height,
      legend: { show: false },
      padding: [8, 12, 0, 0],
      cursor: { y: false, drag: { x: false, y: false }, sync: order.sync ? { key: order.sync } : undefined },
      scales: {
        x: { time: false },
        y: { range: (_, low, high) => this.dressing.yRange ?? roomy(low, high) },
      },
      axes: [axis(order.xTick, 26), axis(order.yTick, 48)],
      series: [{}, ...order.lines.map(asSeries)],
      hooks: {
        drawClear: [(chart) => dress(chart, this.dressing)],
        setCursor: [(chart) => order.pointed(chart.cursor.idx ?? null)],
      },
    };
  }
}

const asSeries = (line: Line): uPlot.Series => ({
  label: line.name,
  stroke: () => colourOf(line.colour),
  width: line.width ?? 2,
  dash: line.dash,
  points: { show: false },
});

/** A range with a little air, from zero where zero is near; a flat line gets some height. */
function roomy(low: number | null, high: number | null): [number, number] {
  if (low === null || high === null || !Number.isFinite(low) || !Number.isFinite(high)) return [0, 1];
  const height = high - low || Math.abs(high) * 0.2 || 1;
  const bottom = low >= 0 && low - 0.06 * height < 0 ? 0 : low - 0.06 * height;
  return [bottom, high + 0.08 * height];
}
