import type { Report } from './types';

const zero = 273.15;

/** Four significant digits without exponent for everyday sizes; "-" where there is no number. */
export function number(value: number | null | undefined, digits = 4): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '-';
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size >= 1e6 || size < 1e-4) return value.toExponential(digits - 1);
  return String(Number(value.toPrecision(digits)));
}

const watts = (value: number | null, digits = 3) => (value === null ? '-' : `${number(value, digits)} W`);
const celsius = (value: number | null) => (value === null ? '-' : `${number(value - zero, 4)} degC`);

/** A value of a margin in the unit a person reads. */
function shown(value: number, unit: string): string {
  if (unit === 'K') return celsius(value);
  if (unit === 'Pa') return `${number(value / 1e6, 3)} MPa`;
  return unit === '1' ? number(value, 3) : `${number(value, 3)} ${unit}`;
}

/** Columns padded to their widest entry, two spaces apart. */
export function table(rows: readonly (readonly string[])[]): string {
  const widths: number[] = [];
  for (const row of rows) row.forEach((cell, k) => (widths[k] = Math.max(widths[k] ?? 0, cell.length)));
  return rows
    .map((row) =>
      row
        .map((cell, k) => cell.padEnd(widths[k]!))
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}

const band = (low: number | null, high: number | null) =>
  low === null || high === null ? '-' : `${number(low, 3)} to ${number(high, 3)} W`;

function optionRows(report: Report): string[][] {
  const head = ['option', 'ceiling', 'band', 'set by', 'at the design power', 'electrical'];
  return [
    head,
    ...report.options.map((option) => {
      const { ceiling } = option;
      const ends = ceiling.reachesRange ? `at least ${watts(ceiling.pumpPower)}` : watts(ceiling.pumpPower);
      const broken = option.margins.filter((margin) => !margin.holds).map((margin) => margin.limit);
      return [
        option.label,
        ceiling.pumpPower === null ? 'none' : ends,
        ceiling.pumpPower === null ? '-' : band(ceiling.low, ceiling.high),
        ceiling.setBy ?? 'no limit in the range',
        option.passes ? 'holds' : `fails: ${broken.join(', ')}`,
        option.state === 'none' ? '-' : watts(option.electricalPower),
      ];
    }),
  ];
}

function stateRows(report: Report): string[][] {
  const rows: string[][] = [['at the design power', 'lasing', 'blocked']];
  const both = (name: string, read: (point: Report['operating']) => string) =>
    rows.push([name, read(report.operating), read(report.blocked)]);
  both('steady state', (point) => point.state);
  both('absorbed', (point) => watts(point.absorbedPower, 4));
  both('heat fraction', (point) => number(point.heatFraction, 3));
  both('heat in the rod', (point) => watts(point.heatLoad, 4));
  both('output', (point) => watts(point.outputPower, 4));
  both('peak temperature', (point) => celsius(point.rod.peakTemperature));
  both('barrel, hottest', (point) => celsius(point.rod.edgeTemperature));
  both('base', (point) => celsius(point.rod.baseTemperature));
  both('diode case', (point) => celsius(point.diode.caseTemperature));
  both('diode wavelength', (point) => `${number(point.diode.wavelength * 1e9, 5)} nm`);
  both('peak tensile stress', (point) => `${number(point.stress.peakTensile / 1e6, 3)} MPa`);
  both('lens, mode-weighted', (point) => `${number(point.lens.dioptricPower, 4)} /m`);
  both('lens, on the axis', (point) => `${number(point.lens.axisDioptricPower, 4)} /m`);
  both(
    'stability m, sagittal / tangential',
    ({ cavity }) => `${number(cavity.sagittal.stability, 3)} / ${number(cavity.tangential.stability, 3)}`,
  );
  return rows;
}

function marginRows(report: Report): string[][] {
  const option = report.options.find((item) => item.id === report.chosenCooler);
  if (!option) return [];
  return [
    [`limits with ${option.label}`, 'value', 'bound', 'margin', 'beam'],
    ...option.margins
      .filter((margin) => margin.limit !== 'steady state' || !margin.holds)
      .map((margin) => [
        margin.limit,
        shown(margin.value, margin.unit),
        shown(margin.bound, margin.unit),
        `${margin.holds ? '' : 'BROKEN '}${number(margin.share * 100, 3)} %`,
        margin.beam,
      ]),
  ];
}

function mountRows(report: Report): string[][] {
  return [
    ['mount', 'ceiling', 'set by', 'peak', 'lens', 'mass'],
    ...report.mounts.map((mount) => [
      `${mount.material}${mount.current ? ' (this design)' : ''}`,
      watts(mount.ceiling),
      mount.setBy ?? '-',
      celsius(mount.peakTemperature),
      `${number(mount.dioptricPower, 4)} /m`,
      mount.thermalConductivity === null ? '-' : `${number(mount.mass * 1e3, 3)} g`,
    ]),
  ];
}

function edgeText(report: Report): string {
  const edge = report.cavityEdge;
  const windows = report.usableWindow.map(
    (w) => `${number(w.fromPumpPower, 3)} to ${number(w.toPumpPower, 3)} W`,
  );
  const window =
    windows.length > 0
      ? `Both planes stable over ${windows.join(' and ')} of pump power.`
      : 'No pump power in the searched range leaves both planes stable.';
  if (edge.pumpPower === null) return `Cavity edge: not reached up to ${watts(report.searchedTo)}. ${window}`;
  const ends = edge.low === null ? '' : `, band ${band(edge.low, edge.high)}`;
  return `Cavity edge: ${watts(edge.pumpPower, 4)} (${edge.plane} plane, lens ${number(edge.dioptricPower, 4)} /m${ends}). ${window}`;
}

/** What the grid alone may have moved. */
function accuracyText({ accuracy }: Report): string[] {
  if (!accuracy) return [];
  const { dioptricPower, peakTemperature } = accuracy;
  return [
    `Grid error at most about ${number(peakTemperature, 2)} K of the peak and ${number(dioptricPower, 2)} /m of the lens; the constants err far more.`,
  ];
}

/**
 * The report as a page of text for a terminal: verdict, ceilings, ladder, cavity edge, state, limits, mounts, warnings.
 * Temperatures in degC, lens power in 1/m, converging positive.
 */
export function reportText(report: Report): string {
  const ladder = report.ladder.map((step) => [
    `${number(step.fromPumpPower, 3)} to ${number(step.toPumpPower, 3)} W`,
    step.option ?? 'no option holds every limit',
  ]);
  const parts = [
    report.title,
    report.verdict.text,
    table(optionRows(report)),
    table([['pump power', 'least demanding cooling that holds'], ...ladder]),
    edgeText(report),
    table(stateRows(report)),
    ...accuracyText(report),
    table(marginRows(report)),
    table(mountRows(report)),
  ];
  if (report.contributors.ceiling.length > 0)
    parts.push(
      table([
        ['what widens the band most', 'at low', 'at high'],
        ...report.contributors.ceiling
          .slice(0, 6)
          .map((item) => [item.label, `x ${number(item.atLow, 3)}`, `x ${number(item.atHigh, 3)}`]),
      ]),
    );
  if (report.warnings.length > 0)
    parts.push(['Warnings', ...report.warnings.map((item) => `- ${item.text}`)].join('\n'));
  parts.push(['Cautions', ...report.cautions.map((text) => `- ${text}`)].join('\n'));
  return `${parts.join('\n\n')}\n`;
}
