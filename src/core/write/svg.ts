import { formatDecimal } from '../geometry/decimal.js';
import type { Program } from '../program/program.js';
import { PathText } from './pathText.js';
import type { CurveStylus } from './stylus.js';
import { traceCurves } from './trace.js';
import { xmlText } from './xmlText.js';

export interface SvgOptions {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly title?: string | null;
  readonly description?: string | null;
  /** Whether to show the lifted travel too, in a last group of its own. */
  readonly travel?: boolean;
  /** Width of the lines of a pen without a width, default 0.3 mm: how it looks, not what is drawn. */
  readonly strokeWidthMm?: number;
  /** Places after the point, default 4, at most 9. */
  readonly decimals?: number;
}

/** Widths are for looking at: kept within what can be written and is not taken for invisible. */
const THINNEST_MM = 0.001;
const THICKEST_MM = 1000;
/** How the name of a pen is kept: `label` of its group, in a name space of our own. */
const NAME_SPACE = 'urn:fewlift:1';
const TRAVEL_OPENS = '\n<g id="travel" fewlift:label="travel"';

/**
 * The program as an SVG drawing in mm: a group for each pen, in it one path for each run, in order, as
 * directed, with its own curves. Arcs are cut to pieces that read back well, and ellipses too flat for
 * that are written as cubics. Every point is within 0.71 steps of the last decimal place, curves
 * within 20. The same program gives the same bytes. O(segments).
 */
export function writeSvg(program: Program, options: SvgOptions): string {
  const decimals = options.decimals ?? 4;
  const width = formatDecimal(options.widthMm, Math.max(decimals, 4));
  const height = formatDecimal(options.heightMm, Math.max(decimals, 4));
  const strokeWidth = options.strokeWidthMm ?? 0.3;
  const lines = [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" xmlns:fewlift="${NAME_SPACE}" version="1.1" width="${width}mm" height="${height}mm" viewBox="0 0 ${width} ${height}" fill="none" stroke-width="${formatDecimal(strokeWidth, 4)}" stroke-linecap="round" stroke-linejoin="round">`,
  ];
  if (options.title) lines.push(`<title>${xmlText(options.title)}</title>`);
  if (options.description) lines.push(`<desc>${xmlText(options.description)}</desc>`);
  const travel: string[] = [];
  traceCurves(program, new SvgStylus(program, decimals, lines, travel));
  if (options.travel === true) {
    const thin = formatDecimal(strokeWidth / 2, 4);
    lines.push(
      // One string: a spread of many legs would overflow the stack.
      `<g id="travel" fewlift:label="travel" stroke="#808080" stroke-width="${thin}" stroke-dasharray="1 1" stroke-linecap="butt">`,
      ...(travel.length > 0 ? [travel.join('\n')] : []),
      '</g>',
    );
  }
  lines.push('</svg>', '');
  return lines.join('\n');
}

/** The same text without the group that shows the travel; text that has none is returned as it is. */
export function withoutTravel(svg: string): string {
  const from = svg.lastIndexOf(TRAVEL_OPENS);
  if (from < 0) return svg;
  return svg.slice(0, from) + svg.slice(svg.lastIndexOf('\n</svg>'));
}

class SvgStylus implements CurveStylus {
  private readonly path: PathText;
  private readonly leg: PathText;

  constructor(
    private readonly program: Program,
    decimals: number,
    private readonly lines: string[],
    private readonly legs: string[],
  ) {
    this.path = new PathText(decimals);
    this.leg = new PathText(decimals);
  }

  beginPen(pen: number): void {
    const { name, colour, widthMm } = this.program.pens[pen];
    const width = widthMm
      ? ` stroke-width="${formatDecimal(Math.min(Math.max(widthMm, THINNEST_MM), THICKEST_MM), 4)}"`
      : '';
    const label = xmlText(name);
    this.lines.push(
      `<g id="pen-${pen + 1}" fewlift:label="${label}" stroke="${strokeOf(colour)}"${width}>`,
      `<title>${label}</title>`,
    );
  }

  travel(x0: number, y0: number, x1: number, y1: number): void {
    if (x0 === x1 && y0 === y1) return;
    this.leg.begin(x0, y0);
    this.leg.line(x1, y1);
    this.legs.push(`<path d="${this.leg.finish()}"/>`);
  }

  beginRun(_run: number, x: number, y: number): void {
    this.path.begin(x, y);
  }

  line(x: number, y: number): void {
    this.path.line(x, y);
  }

  cubic(ax: number, ay: number, bx: number, by: number, x: number, y: number): void {
    this.path.cubic(ax, ay, bx, by, x, y);
  }

  arc(
    cx: number,
    cy: number,
    ux: number,
    uy: number,
    vx: number,
    vy: number,
    theta0: number,
    sweep: number,
    x: number,
    y: number,
  ): void {
    this.path.arc({ cx, cy, ux, uy, vx, vy, theta0, sweep }, x, y);
  }

  endRun(): void {
    this.lines.push(`<path d="${this.path.finish()}"/>`);
  }

  endPen(): void {
    this.lines.push('</g>');
  }
}

/** A pen that stands for a gradient or a pattern has no colour of its own: black, under its name. */
function strokeOf(colour: string): string {
  return /^#[0-9a-f]{6}$/i.test(colour) ? colour : '#000000';
}
