// Runs inside the browser, on an SVG document: how each shape with an id outside `defs` is styled, and the box
// of each `use`. The text of this file is one expression; its value is `SeenStyle` in randomStyles.ts.
(() => {
  const boxOf = (element) => {
    const { x, y, width, height } = element.getBoundingClientRect();
    return [x, y, x + width, y + height];
  };
  const shapes = [...document.querySelectorAll('circle,rect,path')].filter((shape) => !shape.closest('defs'));
  return {
    copied: [...document.querySelectorAll('#t *')].map(({ id }) => id),
    shapes: shapes.flatMap((shape) => {
      const style = getComputedStyle(shape);
      const isShown =
        shape.getClientRects().length > 0 &&
        shape.getBBox().width > 0 &&
        shape.getBBox().height > 0 &&
        shape.checkVisibility({ visibilityProperty: true, opacityProperty: true }) &&
        style.stroke !== 'none' &&
        Number.parseFloat(style.strokeWidth) > 0;
      return isShown ? [{ id: shape.id, box: boxOf(shape), stroke: style.stroke }] : [];
    }),
    copies: [...document.querySelectorAll('use')]
      .filter((use) => use.getClientRects().length > 0)
      .map((use) => ({ id: use.id, box: boxOf(use) })),
  };
})();
