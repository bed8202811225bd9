// Runs inside the browser, on an SVG document: what it draws, one entry per sub-path. The text of this
// file is one function expression; it gives a `BrowserDrawing`, see browser.ts.
//
// The browser parses (the `d` of the computed style: absolute commands), resolves styles and transforms,
// and measures; here only shapes become paths (SVG 2, chapter Basic Shapes) and paths fall into sub-paths.
// getTotalLength is coarse on small shapes, so that everything is measured at 20,000 px across.
(measuredTwice) => {
  const SVG = 'http://www.w3.org/2000/svg';
  const SHAPES = 'path,line,rect,circle,ellipse,polyline,polygon';
  const NEVER_DRAWN = 'defs,symbol,clipPath,mask,pattern,marker,linearGradient,radialGradient,filter';
  const MEASURED_ACROSS = 20000;
  const SAMPLES = 64;
  const copies = replaceCopies(document.documentElement);
  const shapes = [...document.querySelectorAll(SHAPES)]
    .filter((shape) => shape instanceof SVGGeometryElement)
    .map((shape, element) => ({ ...resolved(shape), element }));

  // Measured outside the drawing, which would be laid out again and again. Paths need no layout at all.
  const root = document.createElementNS(SVG, 'svg');
  const bench = document.createElementNS(SVG, 'path');
  document.replaceChild(root, document.documentElement);
  const unmoved = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 };
  const strokes = [];
  let arcsDiffer = 0;
  let wholesDiffer = 0;
  for (const { element, tag, id, shown, matrix, commands, enlarged } of shapes) {
    if (!shown) continue;
    const subPaths = cut(commands);
    if (measuredTwice) {
      const whole = subPaths.reduce((sum, pieces) => sum + measured(pieces, unmoved).length, 0);
      if (whole > 0) wholesDiffer = Math.max(wholesDiffer, differenceToWhole(enlarged, commands, whole));
    }
    for (const pieces of subPaths) {
      const arcs = pieces.filter((piece) => piece.code === 'A');
      if (measuredTwice) arcsDiffer = Math.max(arcsDiffer, ...arcs.map(arcDifference));
      const { length, box } = measured(pieces, matrix);
      if (length === 0 && shown.cap === 'butt') continue;
      strokes.push({
        element,
        tag,
        id,
        lengthPx: length,
        boxPx: box,
        arcs: arcs.length > 0,
        dot: length === 0,
        colour: shown.colour,
      });
    }
  }
  return { strokes, arcsDiffer, wholesDiffer, ...copies };

  /** What there is to know of a shape while it stands in the drawing; `shown` is null where it is not. */
  function resolved(shape) {
    const { localName: tag, id } = shape;
    const style = getComputedStyle(shape);
    const matrix = shape.getScreenCTM();
    const regular = matrix && matrix.a * matrix.d !== matrix.b * matrix.c;
    if (!regular || !isStroked(shape, style)) return { tag, id, shown: null };
    return {
      tag,
      id,
      shown: { cap: style.strokeLinecap, colour: bytesOf(style.stroke) },
      matrix,
      ...outlineOf(shape, style),
    };
  }

  /** The colour as it comes out on a screen, `#rrggbb`; null for paint servers. */
  function bytesOf(stroke) {
    if (stroke.startsWith('url(')) return null;
    const canvas = document.createElementNS('http://www.w3.org/1999/xhtml', 'canvas');
    canvas.width = 1;
    canvas.height = 1;
    const context = canvas.getContext('2d', { willReadFrequently: true });
    // Opaque: bytes under a transparent colour lose their exactness.
    context.fillStyle = stroke.replace(/^rgba\((.*), [^,]*\)$/, 'rgb($1)').replace(/ \/ [^)]*\)$/, ')');
    context.fillRect(0, 0, 1, 1);
    const bytes = [...context.getImageData(0, 0, 1, 1).data].slice(0, 3);
    return `#${bytes.map((byte) => byte.toString(16).padStart(2, '0')).join('')}`;
  }

  /**
   * Puts a group in the place of every `use`, since getScreenCTM inside a copy leaves out the copy's x, y
   * and viewBox. Returns how many, and by how many px the box of a
   * group differs from that of its `use` at most.
   */
  function replaceCopies(root) {
    const before = [...root.querySelectorAll('use')].filter((use) => !use.closest(NEVER_DRAWN));
    const boxes = before.map((use) => use.getClientRects().length > 0 && use.getBBox());
    // What is copied is looked up where nothing has been put in place yet.
    const originals = root.cloneNode(true);
    const original = (id) =>
      originals.id === id ? originals : originals.querySelector(`[id="${CSS.escape(id)}"]`);
    const groups = before.map((use) => replaceCopy(use, original, []));
    let difference = 0;
    groups.forEach((group, i) => {
      const { x, y, width, height } = group.getBBox();
      const box = boxes[i];
      if (!box) return;
      for (const d of [box.x - x, box.y - y, box.width - width, box.height - height]) {
        difference = Math.max(difference, Math.abs(d));
      }
    });
    return { copies: groups.length, copiesDiffer: difference };
  }

  /** `around` holds the ids of the copies that this `use` stands in. */
  function replaceCopy(use, original, around) {
    const href = use.getAttribute('href') ?? use.getAttributeNS('http://www.w3.org/1999/xlink', 'href') ?? '';
    const id = href.startsWith('#') ? href.slice(1) : '';
    const outer = document.createElementNS(SVG, 'g');
    for (const { name, value } of use.attributes) {
      if (!['x', 'y', 'width', 'height', 'href', 'xlink:href'].includes(name))
        outer.setAttribute(name, value);
    }
    // The box of `use` is in its own user space, which its x and y move on.
    const moved = document.createElementNS(SVG, 'g');
    const style = getComputedStyle(use);
    moved.setAttribute('transform', `translate(${lengthOf(use, style, 'x')} ${lengthOf(use, style, 'y')})`);
    outer.append(moved);
    const target = id === '' ? null : original(id);
    if (target && !isInside(use, id) && !around.includes(id)) {
      let copy = target.cloneNode(true);
      copy.removeAttribute('id');
      if (['symbol', 'svg'].includes(target.localName)) {
        const viewport = document.createElementNS(SVG, 'svg');
        for (const { name, value } of copy.attributes) viewport.setAttribute(name, value);
        for (const name of ['width', 'height']) {
          if (use.hasAttribute(name)) viewport.setAttribute(name, use.getAttribute(name));
        }
        viewport.append(...copy.childNodes);
        copy = viewport;
      }
      const ids = [...around, id, ...idsAround(use)];
      moved.append(copy);
      use.replaceWith(outer);
      for (const inner of copy.querySelectorAll('use')) replaceCopy(inner, original, ids);
      if (copy.localName === 'use') replaceCopy(copy, original, ids);
    } else use.replaceWith(outer);
    return outer;
  }

  function isInside(element, id) {
    return idsAround(element).includes(id);
  }

  function idsAround(element) {
    const ids = [];
    for (let e = element; e instanceof Element; e = e.parentNode) if (e.id) ids.push(e.id);
    return ids;
  }

  function isStroked(shape, style) {
    if (shape.closest(NEVER_DRAWN)) return false;
    // Neither of these is enough alone: what lies in a `display: none` has no boxes, and counts as visible.
    if (shape.getClientRects().length === 0) return false;
    if (!shape.checkVisibility({ visibilityProperty: true, opacityProperty: true })) return false;
    for (let svg = shape.ownerSVGElement; svg?.ownerSVGElement; svg = svg.ownerSVGElement) {
      if (!(svg.width.baseVal.value > 0 && svg.height.baseVal.value > 0)) return false;
    }
    const { stroke } = style;
    const server = /^url\("#([^"]*)"\)\s*(.*)$/.exec(stroke);
    const paint = server ? (document.getElementById(server[1]) ? 'black' : server[2] || 'none') : stroke;
    if (paint === 'none' || /^rgba\(.*, 0\)$/.test(paint)) return false;
    return Number.parseFloat(style.strokeWidth) > 0 && Number.parseFloat(style.strokeOpacity) > 0;
  }

  /** The commands of the outline, and a function that gives the same shape as an element `scale` times as large. */
  function outlineOf(shape, style) {
    const { localName: tag } = shape;
    const enlargedBy = (attributesAt) => (scale) => {
      const large = document.createElementNS(SVG, tag);
      for (const [name, value] of Object.entries(attributesAt(scale))) large.setAttribute(name, value);
      return large;
    };
    if (tag === 'path') {
      const commands = commandsOf(style.d);
      return { commands, enlarged: enlargedBy((scale) => ({ d: dataOf(commands, scale) })) };
    }
    if (tag === 'polyline' || tag === 'polygon') {
      const points = [...shape.points].map(({ x, y }) => [x, y]);
      const commands = points.map((numbers, i) => ({ code: i ? 'L' : 'M', numbers }));
      if (points.length > 0 && tag === 'polygon') commands.push({ code: 'Z', numbers: [] });
      const scaled = (scale) => ({
        points: points
          .flat()
          .map((v) => v * scale)
          .join(' '),
      });
      return { commands, enlarged: enlargedBy(scaled) };
    }
    const lengths = {};
    for (const name of ['x', 'y', 'width', 'height', 'rx', 'ry', 'cx', 'cy', 'r', 'x1', 'y1', 'x2', 'y2']) {
      if (!shape[name]) continue;
      const value = name in style ? lengthOf(shape, style, name) : shape[name].baseVal.value;
      const isRadius = ['r', 'rx', 'ry'].includes(name);
      if (value !== null && !(isRadius && value < 0)) lengths[name] = value;
    }
    const scaled = (scale) => Object.fromEntries(Object.entries(lengths).map(([k, v]) => [k, v * scale]));
    return { commands: shapeCommands(tag, lengths), enlarged: enlargedBy(scaled) };
  }

  function shapeCommands(tag, { x = 0, y = 0, width = 0, height = 0, r, rx, ry, cx, cy, x1, y1, x2, y2 }) {
    if (tag === 'line') {
      return [
        { code: 'M', numbers: [x1, y1] },
        { code: 'L', numbers: [x2, y2] },
      ];
    }
    const radiusX = r ?? rx ?? ry ?? 0;
    const radiusY = r ?? ry ?? rx ?? 0;
    if (tag === 'rect') {
      return roundRect(x, y, width, height, (2 * radiusX) / width, (2 * radiusY) / height);
    }
    return roundRect(cx - radiusX, cy - radiusY, 2 * radiusX, 2 * radiusY, 1, 1);
  }

  /** Null for `auto`. The attribute's own number is exact; the computed style has six digits. */
  function lengthOf(shape, style, name) {
    const text = style[name];
    if (text === 'auto') return null;
    const attribute = shape[name].baseVal.value;
    const computed = Number.parseFloat(text);
    const agree = !text.endsWith('px') || Math.abs(attribute - computed) <= 1e-5 * Math.abs(computed);
    return agree ? attribute : computed;
  }

  /** `shareX` and `shareY`: how much of the sides is round; 1 and more is an ellipse. */
  function roundRect(x, y, width, height, shareX, shareY) {
    if (!(width > 0 && height > 0)) return [];
    const rx = (width / 2) * Math.min(1, shareX);
    const ry = (height / 2) * Math.min(1, shareY);
    const [right, bottom] = [x + width, y + height];
    const round = rx > 0 && ry > 0;
    const corner = (toX, toY) => (round ? [{ code: 'A', numbers: [rx, ry, 0, 0, 1, toX, toY] }] : []);
    const [dx, dy] = round ? [rx, ry] : [0, 0];
    return [
      { code: 'M', numbers: [x + dx, y] },
      { code: 'L', numbers: [right - dx, y] },
      ...corner(right, y + dy),
      { code: 'L', numbers: [right, bottom - dy] },
      ...corner(right - dx, bottom),
      { code: 'L', numbers: [x + dx, bottom] },
      ...corner(x, bottom - dy),
      { code: 'L', numbers: [x, y + dy] },
      ...corner(x + dx, y),
      { code: 'Z', numbers: [] },
    ];
  }

  function dataOf(commands, scale) {
    return commands
      .map(({ code, numbers }) => code + numbers.map((v, i) => (isLength(code, i) ? v * scale : v)).join(' '))
      .join('');
  }

  /** The commands of a computed `d`: `path("M 19 13 L 21 12 A 9 9 0 0 1 3 12 Z")`, absolute, none left out. */
  function commandsOf(computed) {
    if (computed === 'none') return [];
    return [...computed.replace(/^path\("|"\)$/g, '').matchAll(/([A-Za-z])([^A-Za-df-z]*)/g)].map(
      ([, code, rest]) => ({
        code,
        numbers:
          rest.trim() === ''
            ? []
            : rest
                .trim()
                .split(/[\s,]+/)
                .map(Number),
      }),
    );
  }

  /** Sub-paths that draw something, as pieces L, C, Q and A with the point where each begins. */
  function cut(commands) {
    const subPaths = [];
    let pieces = [];
    let [x, y, startX, startY, controlX, controlY] = [0, 0, 0, 0, 0, 0];
    let before = '';
    const end = () => {
      if (pieces.length > 0) subPaths.push(pieces);
      pieces = [];
    };
    const piece = (code, ...numbers) => {
      pieces.push({ code, from: [x, y], numbers });
      [x, y] = numbers.slice(-2);
    };
    for (const { code, numbers: n } of commands) {
      const mirrored = (codes) => (codes.includes(before) ? [2 * x - controlX, 2 * y - controlY] : [x, y]);
      if (code === 'M') {
        end();
        [x, y, startX, startY] = [n[0], n[1], n[0], n[1]];
      } else if (code === 'Z') {
        // A path that is closed already is not closed again.
        if (before !== 'Z') piece('L', startX, startY);
        end();
      } else if (code === 'L') piece('L', ...n);
      else if (code === 'H') piece('L', n[0], y);
      else if (code === 'V') piece('L', x, n[0]);
      else if (code === 'A') piece(...(isLine(n, x, y) ? ['L', ...n.slice(5)] : ['A', ...n]));
      else if (code === 'C') {
        [controlX, controlY] = [n[2], n[3]];
        piece('C', ...n);
      } else if (code === 'S') {
        const first = mirrored('CS');
        [controlX, controlY] = [n[0], n[1]];
        piece('C', ...first, ...n);
      } else if (code === 'Q') {
        [controlX, controlY] = [n[0], n[1]];
        piece('Q', ...n);
      } else if (code === 'T') {
        [controlX, controlY] = mirrored('QT');
        piece('Q', controlX, controlY, ...n);
      } else throw new Error(`a command ${code} in a computed d`);
      before = code;
    }
    end();
    return subPaths;
  }

  /** SVG 2, "Out-of-range elliptical arc parameters". */
  function isLine([rx, ry, , , , toX, toY], x, y) {
    return rx === 0 || ry === 0 || (toX === x && toY === y);
  }

  /** Length and box of one sub-path where the matrix puts it. */
  function measured(pieces, { a, b, c, d, e, f }) {
    let length = 0;
    const box = [Infinity, Infinity, -Infinity, -Infinity];
    for (const piece of pieces) {
      const mapped = ([x, y]) => [a * x + c * y, b * x + d * y];
      const [x, y] = mapped(piece.from);
      const points = pointsAlong(piece).map(mapped);
      widen(box, points, x + e, y + f);
      length += piece.code === 'A' ? chordsExtrapolated(points) : plainLength(relative(piece), mapped);
    }
    return { length, box };
  }

  /** Length of a line or a Bezier curve from 0, 0, whose points are mapped. */
  function plainLength({ code, numbers }, mapped) {
    const points = pairs(numbers).map(mapped);
    if (code === 'L') return Math.hypot(...points[0]);
    const scale = putOnBench({ code, numbers: points.flat() });
    return bench.getTotalLength() / scale;
  }

  /** Points of a piece, taken from its start, at equal steps of its parameter. */
  function pointsAlong(piece) {
    const { code, numbers } = relative(piece);
    if (code === 'A') return pointsOfArc(numbers);
    const control = [[0, 0], ...pairs(numbers)];
    if (code === 'L') return control;
    const between = ([x0, y0], [x1, y1], t) => [x0 + t * (x1 - x0), y0 + t * (y1 - y0)];
    return Array.from({ length: SAMPLES + 1 }, (_, i) => {
      let points = control;
      while (points.length > 1) points = points.slice(1).map((p, k) => between(points[k], p, i / SAMPLES));
      return points[0];
    });
  }

  /** SVG 2, "Arc implementation notes", from 0, 0: the browser itself draws arcs as cubics, 0.014 % too long. */
  function pointsOfArc([radiusX, radiusY, degrees, large, sweep, x, y]) {
    let [rx, ry] = [Math.abs(radiusX), Math.abs(radiusY)];
    const [cos, sin] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
    const [x1, y1] = [(-cos * x - sin * y) / 2, (sin * x - cos * y) / 2];
    const lambda = (x1 / rx) ** 2 + (y1 / ry) ** 2;
    if (lambda > 1) [rx, ry] = [rx * Math.sqrt(lambda), ry * Math.sqrt(lambda)];
    const size = Math.sqrt(Math.max(0, 1 / Math.min(lambda, 1) - 1)) * (lambda > 1 ? 0 : 1);
    const sign = large === sweep ? -size : size;
    const [cx, cy] = [(sign * rx * y1) / ry, (-sign * ry * x1) / rx];
    const start = Math.atan2((y1 - cy) / ry, (x1 - cx) / rx);
    let turn = Math.atan2((-y1 - cy) / ry, (-x1 - cx) / rx) - start;
    if (sweep && turn < 0) turn += 2 * Math.PI;
    if (!sweep && turn > 0) turn -= 2 * Math.PI;
    // Long thin ellipses bend sharply at their ends.
    const steps = SAMPLES * Math.min(32, Math.ceil(Math.max(rx / ry, ry / rx)));
    return Array.from({ length: steps + 1 }, (_, i) => {
      const angle = start + (turn * i) / steps;
      const [u, v] = [rx * Math.cos(angle) + cx, ry * Math.sin(angle) + cy];
      return [cos * u - sin * v + x / 2, sin * u + cos * v + y / 2];
    });
  }

  /** How far the middle of the browser's own arc lies off the points of ours, relative to the arc's size. */
  function arcDifference(piece) {
    const scale = putOnBench(relative(piece));
    const middle = bench.getPointAtLength(bench.getTotalLength() / 2);
    const [x, y] = [middle.x / scale, middle.y / scale];
    const points = pointsAlong(piece);
    let [nearest, across] = [Infinity, 0];
    for (let i = 1; i < points.length; i++) {
      const [[x0, y0], [x1, y1]] = [points[i - 1], points[i]];
      const square = (x1 - x0) ** 2 + (y1 - y0) ** 2;
      const along = square > 0 ? ((x - x0) * (x1 - x0) + (y - y0) * (y1 - y0)) / square : 0;
      const t = Math.min(1, Math.max(0, along));
      nearest = Math.min(nearest, Math.hypot(x0 + t * (x1 - x0) - x, y0 + t * (y1 - y0) - y));
      across = Math.max(across, Math.hypot(x1, y1));
    }
    return across > 0 ? nearest / across : 0;
  }

  /** An arc's length from chords of two step sizes. */
  function chordsExtrapolated(points) {
    const chords = (step) => {
      let sum = 0;
      for (let i = step; i < points.length; i += step) {
        sum += Math.hypot(points[i][0] - points[i - step][0], points[i][1] - points[i - step][1]);
      }
      return sum;
    };
    return (4 * chords(1) - chords(2)) / 3;
  }

  /** The piece as a command from 0, 0. */
  function relative({ code, from, numbers }) {
    const isPlace = (i) => code !== 'A' || i > 4;
    const axis = (i) => (code === 'A' ? i + 1 : i) % 2;
    return { code, numbers: numbers.map((v, i) => (isPlace(i) ? v - from[axis(i)] : v)) };
  }

  function pairs(numbers) {
    return Array.from({ length: numbers.length / 2 }, (_, i) => numbers.slice(2 * i, 2 * i + 2));
  }

  /** Puts one command, from 0, 0 and enlarged, on the bench; returns how much it is enlarged. */
  function putOnBench(command) {
    const scale = enlargement([command]);
    bench.setAttribute('d', `M0 0${dataOf([command], scale)}`);
    return scale;
  }

  function enlargement(commands) {
    let across = 0;
    for (const { code, numbers } of commands) {
      numbers.forEach((v, i) => {
        if (isLength(code, i)) across = Math.max(across, Math.abs(v));
      });
    }
    return across > 0 ? MEASURED_ACROSS / across : 1;
  }

  function isLength(code, i) {
    return code !== 'A' || i < 2 || i > 4;
  }

  /** Between samples the far point of a curve is that of a parabola through three of them. */
  function widen(box, points, x0, y0) {
    [x0, y0].forEach((start, axis) => {
      const v = points.map((point) => start + point[axis]);
      const add = (value) => {
        box[axis] = Math.min(box[axis], value);
        box[axis + 2] = Math.max(box[axis + 2], value);
      };
      v.forEach(add);
      for (let i = 1; i + 1 < v.length; i++) {
        const slope = (v[i + 1] - v[i - 1]) / 2;
        const bend = v[i + 1] - 2 * v[i] + v[i - 1];
        if (Math.abs(slope) <= Math.abs(bend)) add(v[i] - (bend === 0 ? 0 : slope ** 2 / (2 * bend)));
      }
    });
  }

  /**
   * By how much, relatively, the pieces of an element together differ in length from the element as the
   * browser measures it in one, enlarged. Elements below 1 px count as if they were 1 px long.
   */
  function differenceToWhole(enlarged, commands, lengthPx) {
    const scale = enlargement(commands);
    const large = enlarged(scale);
    if (large.localName !== 'path') root.append(large);
    const whole = large.getTotalLength() / scale;
    large.remove();
    return Math.abs(whole - lengthPx) / Math.max(lengthPx, 1);
  }
};
