/** A number with at most three decimals: a micrometre. */
export const n = (value) => String(Math.round(value * 1000) / 1000 + 0);

/** A page in mm, its viewBox in mm too; `body` is one element a line. */
export function svg(width, height, title, body, { stroke = '#000000', strokeWidth = 0.3 } = {}) {
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" viewBox="0 0 ${width} ${height}" fill="none" stroke="${stroke}" stroke-width="${strokeWidth}" stroke-linecap="round">\n<title>${title}</title>\n${body.join('\n')}\n</svg>\n`;
}

export const line = (x0, y0, x1, y1) => `<line x1="${n(x0)}" y1="${n(y0)}" x2="${n(x1)}" y2="${n(y1)}"/>`;
export const path = (d) => `<path d="${d}"/>`;
export const dot = (x, y) => path(`M${n(x)} ${n(y)}h0`);
export const polyline = (points) =>
  `<polyline points="${points.map(([x, y]) => `${n(x)},${n(y)}`).join(' ')}"/>`;
