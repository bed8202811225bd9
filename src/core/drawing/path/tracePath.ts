import { arcFromEndpoints } from '../../geometry/arc.js';
import type { PathSink } from '../stroke/subPathSink.js';
import type { PathCommands } from './pathCommands.js';

/** Sums of relative coordinates miss their target by less than this share of the largest of them. */
const ROUNDING = 2 ** -40;

/** What the last command leaves for a smooth one to mirror. */
const NEITHER = 0;
const CUBIC = 1;
const QUADRATIC = 2;

/** Draws all commands of a path, see `PathTracer`. */
export function tracePath(commands: PathCommands, sink: PathSink): void {
  new PathTracer(sink).draw(commands);
}

/**
 * Draws path data, some commands at a time: relative to absolute, smooth control points mirrored,
 * quadratics raised to cubics, arcs by their centre. Source: SVG 2, "Path data", and for arcs out of
 * range, "Elliptical arc implementation notes".
 */
export class PathTracer {
  private x = 0;
  private y = 0;
  private startX = 0;
  private startY = 0;
  private controlX = 0;
  private controlY = 0;
  private last = NEITHER;
  private open = false;
  private largest = 0;

  constructor(private readonly sink: PathSink) {}

  draw(commands: PathCommands): void {
    const { sink } = this;
    const n = commands.numbers;
    let at = 0;
    let { x, y, startX, startY, controlX, controlY, last, open, largest } = this;

    for (let i = 0; i < commands.count; i++) {
      const code = commands.codes[i];
      const relative = code >= 97;
      const bx = relative ? x : 0;
      const by = relative ? y : 0;
      const command = code & ~32;
      if (!open && command !== 77 && command !== 90) {
        // After a closepath the next sub-path starts where the last one did.
        sink.moveTo(startX, startY);
        open = true;
      }
      let kind = NEITHER;
      switch (command) {
        case 77: // M
          x = startX = bx + n[at++];
          y = startY = by + n[at++];
          sink.moveTo(x, y);
          open = true;
          largest = 0;
          break;
        case 76: // L
          x = bx + n[at++];
          y = by + n[at++];
          sink.lineTo(x, y);
          break;
        case 72: // H
          x = bx + n[at++];
          sink.lineTo(x, y);
          break;
        case 86: // V
          y = by + n[at++];
          sink.lineTo(x, y);
          break;
        case 67: // C
        case 83: {
          // S
          const mirrored = last === CUBIC;
          let ax = mirrored ? 2 * x - controlX : x;
          let ay = mirrored ? 2 * y - controlY : y;
          if (command === 67) {
            ax = bx + n[at++];
            ay = by + n[at++];
          }
          controlX = bx + n[at++];
          controlY = by + n[at++];
          x = bx + n[at++];
          y = by + n[at++];
          sink.cubicTo(ax, ay, controlX, controlY, x, y);
          kind = CUBIC;
          break;
        }
        case 81: // Q
        case 84: {
          // T
          if (command === 81) {
            controlX = bx + n[at++];
            controlY = by + n[at++];
          } else {
            const mirrored = last === QUADRATIC;
            controlX = mirrored ? 2 * x - controlX : x;
            controlY = mirrored ? 2 * y - controlY : y;
          }
          const ax = (x + 2 * controlX) / 3;
          const ay = (y + 2 * controlY) / 3;
          x = bx + n[at++];
          y = by + n[at++];
          sink.cubicTo(ax, ay, (x + 2 * controlX) / 3, (y + 2 * controlY) / 3, x, y);
          kind = QUADRATIC;
          break;
        }
        case 65: {
          // A
          const toX = bx + n[at + 5];
          const toY = by + n[at + 6];
          const large = n[at + 3] === 1;
          const sweep = n[at + 4] === 1;
          const arc = arcFromEndpoints(x, y, n[at], n[at + 1], n[at + 2], large, sweep, toX, toY);
          if (typeof arc === 'string') sink.lineTo(toX, toY);
          else sink.arcTo(arc, toX, toY);
          x = toX;
          y = toY;
          at += 7;
          break;
        }
        default: // Z
          if (open) {
            const gap = Math.max(Math.abs(x - startX), Math.abs(y - startY));
            sink.closePath(gap <= ROUNDING * largest);
          }
          x = startX;
          y = startY;
          open = false;
      }
      last = kind;
      largest = Math.max(largest, Math.abs(x), Math.abs(y));
    }
    this.x = x;
    this.y = y;
    this.startX = startX;
    this.startY = startY;
    this.controlX = controlX;
    this.controlY = controlY;
    this.last = last;
    this.open = open;
    this.largest = largest;
  }
}
