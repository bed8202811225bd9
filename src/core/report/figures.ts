/** How figures are put for people: one place, so that every table reads alike. */

export function mm(value: number): string {
  return `${value.toFixed(1)} mm`;
}

/** Small distances, to a tenth of a micrometre. */
export function fineMm(value: number): string {
  return `${value.toFixed(4)} mm`;
}

/** A size: at most two decimals, none where not needed. */
export function size(value: number): string {
  return String(Math.round(value * 100) / 100);
}

/** Seconds below a minute; then minutes and seconds; hours and minutes from an hour on. */
export function duration(seconds: number): string {
  if (seconds < 59.95) return `${seconds.toFixed(1)} s`;
  const whole = Math.round(seconds);
  const two = (n: number) => String(n).padStart(2, '0');
  if (whole < 3600) return `${Math.floor(whole / 60)}:${two(whole % 60)} min`;
  return `${Math.floor(whole / 3600)}:${two(Math.floor(whole / 60) % 60)} h`;
}

export function count(n: number, one: string, many = `${one}s`): string {
  return `${n} ${n === 1 ? one : many}`;
}

/** After against before in per cent; nothing where there was nothing. */
export function change(before: number, after: number): string {
  if (before === 0) return '';
  const percent = ((100 * (after - before)) / before).toFixed(1);
  if (Number(percent) === 0) return '0.0 %';
  return `${after > before ? '+' : ''}${percent} %`;
}

interface Totals {
  readonly runs: number;
  readonly travelMm: number;
  readonly drawnMm: number;
  readonly seconds: number;
}

/** What either costs to draw, side by side, with the change. */
export function sideBySide(before: Totals, after: Totals): string[] {
  return columns([
    ['', 'before', 'after', 'change'],
    ['runs', `${before.runs}`, `${after.runs}`, change(before.runs, after.runs)],
    ['travel', mm(before.travelMm), mm(after.travelMm), change(before.travelMm, after.travelMm)],
    ['drawn', mm(before.drawnMm), mm(after.drawnMm), change(before.drawnMm, after.drawnMm)],
    ['time', duration(before.seconds), duration(after.seconds), change(before.seconds, after.seconds)],
  ]);
}

/** Rows in columns: the first to the left, the others to the right; every line indented by two. */
export function columns(rows: readonly (readonly string[])[]): string[] {
  const width = rows[0].map((_, c) => rows.reduce((most, row) => Math.max(most, row[c].length), 0));
  return rows.map((row) =>
    `  ${row.map((cell, c) => (c === 0 ? cell.padEnd(width[c]) : cell.padStart(width[c]))).join('  ')}`.trimEnd(),
  );
}
