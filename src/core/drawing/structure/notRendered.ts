/** Never drawn where they stand, and without a box there; some of them are used by others, from there. */
export const NOT_RENDERED: ReadonlySet<string> = new Set([
  ...['defs', 'symbol', 'clipPath', 'mask', 'pattern', 'marker', 'linearGradient', 'radialGradient'],
  ...['filter', 'title', 'desc', 'metadata', 'style', 'script', 'animate', 'animateTransform'],
  ...['animateMotion', 'animateColor', 'set', 'mpath', 'view', 'cursor', 'font', 'font-face'],
  ...['color-profile', 'stop', 'meshgradient', 'hatch', 'solidcolor', 'solidColor', 'tspan', 'textPath'],
  ...['tref', 'link', 'discard'],
]);
