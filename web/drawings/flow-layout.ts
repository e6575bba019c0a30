import type { Flow } from '../../src/report/types';

/** A layered flow picture: nodes in columns, ribbons between them, all widths in proportion to power. */
export interface FlowNode {
  name: string;
  column: number;
  power: number;
  /** Across the columns, from the start of the column, in drawing units. */
  from: number;
  to: number;
}

export interface Ribbon extends Flow {
  source: FlowNode;
  target: FlowNode;
  sourceAt: number;
  targetAt: number;
  width: number;
}

/** Column of each node: the longest way to it from a node nothing flows into; a loop is cut after as many steps as there are nodes. */
function columnsOf(flows: Flow[]): Map<string, number> {
  const columns = new Map<string, number>();
  for (const { from, to } of flows) columns.set(from, 0).set(to, 0);
  for (let pass = 0; pass < columns.size; pass += 1)
    for (const { from, to } of flows)
      columns.set(to, Math.min(columns.size, Math.max(columns.get(to)!, columns.get(from)! + 1)));
  return columns;
}

const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);

/**
 * Lays the ledger out.
 * @param across room across the columns, drawing units
 * @param gap between nodes of one column
 * @returns nodes and ribbons; flows that are not positive are left out of the picture (the table shows them)
 */
export function layOutFlows(
  ledger: Flow[],
  across: number,
  gap: number,
): { nodes: FlowNode[]; ribbons: Ribbon[]; columns: number } {
  const flows = ledger.filter((flow) => flow.power > 0 && flow.from !== flow.to);
  const columns = columnsOf(flows);
  const powerOf = (name: string) =>
    Math.max(
      sum(flows.filter((f) => f.from === name).map((f) => f.power)),
      sum(flows.filter((f) => f.to === name).map((f) => f.power)),
    );
  const count = Math.max(0, ...columns.values()) + 1;
  const lanes = Array.from({ length: count }, (_, column) =>
    [...columns].filter(([, at]) => at === column).map(([name]) => name),
  );
  const scale = Math.min(
    ...lanes.map((lane) => (across - gap * (lane.length - 1)) / Math.max(1e-12, sum(lane.map(powerOf)))),
  );
  const nodes = new Map<string, FlowNode>();
  lanes.forEach((lane, column) => {
    const filled = sum(lane.map(powerOf)) * scale + gap * (lane.length - 1);
    let at = (across - filled) / 2;
    for (const name of lane) {
      const power = powerOf(name);
      nodes.set(name, { name, column, power, from: at, to: at + power * scale });
      at += power * scale + gap;
    }
  });
  const leaving = new Map<string, number>();
  const arriving = new Map<string, number>();
  const take = (used: Map<string, number>, name: string, width: number) => {
    const at = used.get(name) ?? 0;
    used.set(name, at + width);
    return at;
  };
  const byTarget = [...flows].sort((a, b) => nodes.get(a.to)!.from - nodes.get(b.to)!.from);
  const starts = new Map(byTarget.map((flow) => [flow, take(leaving, flow.from, flow.power * scale)]));
  const bySource = [...flows].sort((a, b) => nodes.get(a.from)!.from - nodes.get(b.from)!.from);
  const ribbons = bySource.map((flow) => {
    const [source, target] = [nodes.get(flow.from)!, nodes.get(flow.to)!];
    const width = flow.power * scale;
    return {
      ...flow,
      source,
      target,
      width,
      sourceAt: source.from + starts.get(flow)!,
      targetAt: target.from + take(arriving, flow.to, width),
    };
  });
  return { nodes: [...nodes.values()], ribbons, columns: count };
}

const characterWidth = 6;

/**
 * How much higher each node's word is written so that words of one column do not run into each other, for a picture
 * that flows down the page.
 */
export function raisedWords(nodes: FlowNode[]): Map<string, number> {
  const lifts = new Map<string, number>();
  const ends = new Map<number, number[]>();
  for (const node of [...nodes].sort((a, b) => a.from - b.from)) {
    const half = ((node.name.length + 7) * characterWidth) / 2;
    const middle = (node.from + node.to) / 2;
    const lanes = ends.get(node.column) ?? [];
    const lane = [0, 1, 2, 3].find((line) => (lanes[line] ?? -Infinity) < middle - half) ?? 3;
    lanes[lane] = middle + half;
    ends.set(node.column, lanes);
    lifts.set(node.name, 13 * lane);
  }
  return lifts;
}
