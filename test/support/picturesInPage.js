// Runs inside the browser: paints two drawings at the same size and compares what is inked. The text of
// this file is one function expression; what it takes and gives is told in pixels.ts.
async ({ original, ours, widthMm, heightMm, pxPerMm, strokesOnly, keepPicture }) => {
  const [widthPx, heightPx] = [widthMm, heightMm].map((mm) => Math.round(mm * pxPerMm));
  const SVG = 'http://www.w3.org/2000/svg';
  /** Of 255: a quarter of a px, and what counts as ink when it is looked for. */
  const INKED = 64;
  const FOUND = 24;
  const COLOUR = 64;
  /** Steps to the px within 2 px, right and down. */
  const NEAR = [0, 0, 0, -1, 0, 1, -1, 0, 1, 0, -1, -1, -1, 1, 1, -1, 1, 1, 0, -2, 0, 2, -2, 0, 2, 0];
  /** Places are told by squares of that side. */
  const SQUARE = 24;

  const a = await painted(prepared());
  const b = await painted(ours);
  const missing = notFound(a.pixels, b.pixels);
  const extra = notFound(b.pixels, a.pixels);
  return {
    inkPx: missing.ink,
    missing: missing.count / Math.max(1, missing.ink),
    extra: extra.count / Math.max(1, missing.ink),
    missingAt: missing.at,
    extraAt: extra.at,
    picture: keepPicture ? sideBySide() : '',
  };

  /** As an image, in which nothing runs and nothing is loaded. */
  async function painted(text) {
    const image = new Image();
    image.src = URL.createObjectURL(new Blob([text], { type: 'image/svg+xml' }));
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = widthPx;
    canvas.height = heightPx;
    const pen = canvas.getContext('2d', { willReadFrequently: true });
    pen.drawImage(image, 0, 0, widthPx, heightPx);
    URL.revokeObjectURL(image.src);
    return { canvas, pixels: pen.getImageData(0, 0, widthPx, heightPx).data };
  }

  /**
   * An image has a size in whole px, and none by a style. A drawing of another size is given the picture's
   * own: by its viewBox, or by one that says what its units are without.
   */
  function prepared() {
    const parsed = new DOMParser().parseFromString(original, 'image/svg+xml');
    const root = parsed.documentElement;
    const sidesPx = [widthMm, heightMm].map((mm) => (mm * 96) / 25.4);
    const byStyle = root.style.width !== '' || root.style.height !== '';
    if (byStyle || sidesPx.some((px) => Math.abs(px - Math.round(px)) > 1e-6)) {
      if (!root.hasAttribute('viewBox')) {
        root.setAttribute('viewBox', `0 0 ${sidesPx.join(' ')}`);
        root.setAttribute('preserveAspectRatio', 'none');
      }
      for (const side of ['width', 'height']) root.style.removeProperty(side);
      root.setAttribute('width', widthPx);
      root.setAttribute('height', heightPx);
    }
    if (strokesOnly) {
      const sheet = parsed.createElementNS(SVG, 'style');
      sheet.textContent =
        '*{fill:none!important;marker:none!important;background:none!important}text,image{display:none!important}';
      root.append(sheet);
      // A canvas with one in it cannot be read any more.
      for (const foreign of parsed.querySelectorAll('foreignObject')) foreign.remove();
    }
    return new XMLSerializer().serializeToString(parsed);
  }

  function notFound(from, other) {
    let ink = 0;
    let count = 0;
    const squares = new Map();
    for (let y = 0; y < heightPx; y++) {
      for (let x = 0; x < widthPx; x++) {
        const p = 4 * (y * widthPx + x);
        if (from[p + 3] < INKED) continue;
        ink++;
        if (isNear(from, p, other, x, y)) continue;
        count++;
        const square = `${Math.floor(x / SQUARE)} ${Math.floor(y / SQUARE)}`;
        squares.set(square, (squares.get(square) ?? 0) + 1);
      }
    }
    const [most] = [...squares].sort(([, m], [, n]) => n - m);
    const middle = (n) => ((Number(n) + 0.5) * SQUARE) / pxPerMm;
    const at = most ? most[0].split(' ').map((n) => middle(n).toFixed(1)) : [];
    return { ink, count, at: at.join(',') };
  }

  function isNear(from, p, other, x, y) {
    for (let k = 0; k < NEAR.length; k += 2) {
      if (isLike(from, p, other, x + NEAR[k], y + NEAR[k + 1])) return true;
    }
    return false;
  }

  function isLike(from, p, other, x, y) {
    if (x < 0 || y < 0 || x >= widthPx || y >= heightPx) return false;
    const q = 4 * (y * widthPx + x);
    if (other[q + 3] < FOUND) return false;
    for (let k = 0; k < 3; k++) if (Math.abs(from[p + k] - other[q + k]) > COLOUR) return false;
    return true;
  }

  /** Ink only in the original red, only in ours blue, in both grey. */
  function sideBySide() {
    const canvas = document.createElement('canvas');
    canvas.width = 2 * widthPx + 20;
    canvas.height = heightPx;
    const pen = canvas.getContext('2d');
    pen.fillStyle = '#fff';
    pen.fillRect(0, 0, canvas.width, canvas.height);
    pen.drawImage(a.canvas, 0, 0);
    const mixed = pen.createImageData(widthPx, heightPx);
    for (let p = 0; p < mixed.data.length; p += 4) {
      const [theirs, mine] = [a.pixels[p + 3], b.pixels[p + 3]];
      const both = Math.min(theirs, mine);
      mixed.data[p] = 255 - mine + both / 4;
      mixed.data[p + 1] = 255 - Math.max(theirs, mine) + both / 4;
      mixed.data[p + 2] = 255 - theirs + both / 4;
      mixed.data[p + 3] = 255;
    }
    pen.putImageData(mixed, widthPx + 20, 0);
    return canvas.toDataURL('image/png');
  }
};
