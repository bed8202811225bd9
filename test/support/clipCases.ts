/**
 * Small drawings that a browser shows only parts of: by clip paths, viewports and the edge of the page.
 * Thin lines, so that what a clip leaves of a line's width does not count.
 */
const page = (body: string, size = 'width="60mm" height="40mm" viewBox="0 0 60 40"'): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ${size} fill="none" stroke="black" stroke-width=".15">${body}</svg>`;

/** Rows and slanted lines all over the page, which show where any clip ends. */
const rows = Array.from({ length: 26 }, (_, k) => `M-4 ${1.5 * k + 0.7}H64`).join('');
const slants = Array.from({ length: 10 }, (_, k) => `M${8 * k - 20} -3l26 46`).join('');
const HATCH = `<path d="${rows}${slants}"/>`;
const hatched = (attributes: string): string => `<g ${attributes}>${HATCH}</g>`;
const clip = (inside: string, attributes = ''): string =>
  `<clipPath id="c" ${attributes}>${inside}</clipPath>`;
const BY_C = 'clip-path="url(#c)"';
const SHAPE = '<path d="M30 3C70 3 50 40 30 36S0 3 30 3z"/>';

const ruled = (rule: string): string =>
  page(`${clip(`<path ${rule} d="M5 5H50V35H10V12H40V28H20V8H55V20H5z"/>`)}${hatched(BY_C)}`);

export const CLIP_CASES: Readonly<Record<string, string>> = {
  // What a clipPath may hold.
  'a rectangle': page(`${clip('<rect x="10" y="8" width="35" height="22"/>')}${hatched(BY_C)}`),
  'a rounded rectangle': page(
    `${clip('<rect x="10" y="8" width="35" height="22" rx="9" ry="5"/>')}${hatched(BY_C)}`,
  ),
  'a circle': page(`${clip('<circle cx="30" cy="20" r="15"/>')}${hatched(BY_C)}`),
  'an ellipse, turned': page(
    `${clip('<ellipse cx="30" cy="20" rx="25" ry="9" transform="rotate(25 30 20)"/>')}${hatched(BY_C)}`,
  ),
  'a polygon': page(`${clip('<polygon points="5,5 55,12 40,38 22,18 10,35"/>')}${hatched(BY_C)}`),
  'a polyline, which is closed': page(`${clip('<polyline points="5,5 55,12 40,38"/>')}${hatched(BY_C)}`),
  'a path of curves': page(`${clip(SHAPE)}${hatched(BY_C)}`),
  'a path of arcs, not closed': page(
    `${clip('<path d="M8 20A14 10 0 0 1 36 20 12 12 0 1 1 40 32"/>')}${hatched(BY_C)}`,
  ),
  'several shapes that overlap': page(
    `${clip('<circle cx="20" cy="18" r="12"/><rect x="24" y="10" width="25" height="12"/><path d="M40 30h15v8h-20z"/>')}${hatched(BY_C)}`,
  ),
  'shapes side by side': page(
    `${clip('<rect x="10" y="5" width="20" height="30"/><rect x="30" y="5" width="20" height="30"/>')}${hatched(BY_C)}`,
  ),
  'a line, which encloses nothing': page(
    `${clip('<line x1="0" y1="0" x2="60" y2="40"/>')}${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  'nothing at all': page(`${clip('')}${hatched(BY_C)}<path d="M3 3h5"/>`),
  'a group, which does not count': page(
    `${clip('<g><circle cx="30" cy="20" r="15"/></g><rect x="2" y="2" width="12" height="12"/>')}${hatched(BY_C)}`,
  ),
  'a use of a shape': page(
    `<defs><circle id="o" cx="5" cy="5" r="10"/></defs>${clip('<use xlink:href="#o" x="20" y="12" transform="scale(1.2 1)"/>')}${hatched(BY_C)}`,
  ),
  'a use of a group, which does not count': page(
    `<defs><g id="o"><circle cx="5" cy="5" r="10"/></g></defs>${clip('<use href="#o" x="20" y="12"/><rect width="9" height="9"/>')}${hatched(BY_C)}`,
  ),
  'hidden children': page(
    `${clip('<circle cx="12" cy="20" r="9" display="none"/><circle cx="30" cy="20" r="9" visibility="hidden"/><circle cx="48" cy="20" r="9"/>')}${hatched(BY_C)}`,
  ),
  'strokes, fills and opacity do not count': page(
    `${clip('<circle cx="30" cy="20" r="12" fill="none" stroke="red" stroke-width="9" opacity="0"/>')}${hatched(BY_C)}`,
  ),

  // Rules.
  nonzero: ruled('clip-rule="nonzero"'),
  evenodd: ruled('clip-rule="evenodd"'),
  'evenodd from the clipPath': page(
    `${clip('<path d="M5 5H50V35H10V12H40V28H20V8H55V20H5z"/>', 'clip-rule="evenodd"')}${hatched(BY_C)}`,
  ),
  'evenodd in a style': ruled('style="clip-rule: evenodd"'),
  'fill-rule, which does not count': ruled('fill-rule="evenodd"'),
  'clip-rule of the one clipped, which does not count': page(
    `${clip('<path d="M5 5H50V35H10V12H40V28H20V8H55V20H5z"/>')}${hatched(`${BY_C} clip-rule="evenodd"`)}`,
  ),

  // Where it stands.
  'the transform of what is clipped': page(
    `${clip('<rect x="10" y="8" width="35" height="22"/>')}${hatched(`${BY_C} transform="rotate(15 30 20) skewX(10)"`)}`,
  ),
  'a transform around what is clipped': page(
    `${clip(SHAPE)}<g transform="translate(8 4) scale(.7 .8)">${hatched(BY_C)}</g>`,
  ),
  'the transform of the clipPath and of its child': page(
    `${clip('<rect x="10" y="8" width="35" height="22" transform="skewY(8)"/>', 'transform="rotate(-20 30 20)"')}${hatched(BY_C)}`,
  ),
  'a transform where the clipPath stands, which does not count': page(
    `<g transform="translate(20 0) rotate(30)">${clip(SHAPE)}</g>${hatched(BY_C)}`,
  ),
  'a clipPath defined later': page(`${hatched(BY_C)}<defs>${clip(SHAPE)}</defs>`),
  'a clipPath in what is not displayed': page(`<g display="none">${clip(SHAPE)}</g>${hatched(BY_C)}`),
  'each path by itself': page(
    `${clip(SHAPE)}<path ${BY_C} d="M2 2L58 38"/><path ${BY_C} d="M2 38C20 -20 40 60 58 2" transform="translate(1 0)"/><circle ${BY_C} cx="30" cy="6" r="9"/>`,
  ),
  'a closed line cut, its start inside': page(
    `${clip('<rect x="10" y="8" width="35" height="22"/>')}<path ${BY_C} d="M30 20L55 10 30 36 5 10z"/><ellipse ${BY_C} cx="30" cy="20" rx="22" ry="7"/>`,
  ),
  'by class and in quotes': page(
    `<style>.k{clip-path:url("#c")}</style>${clip(SHAPE)}<g class="k">${HATCH}</g>`,
  ),
  percentages: page(`${clip('<rect x="20%" y="25%" width="50%" height="40%"/>')}${hatched(BY_C)}`),

  // Units.
  'in parts of the box, a path': page(
    `${clip('<circle cx=".5" cy=".5" r=".45"/>', 'clipPathUnits="objectBoundingBox"')}<path ${BY_C} d="M10 5L50 5 50 33 10 33zM10 5L50 33M50 5L10 33M10 19H50"/>`,
  ),
  'in parts of the box, a group': page(
    `${clip('<path d="M0 0L1 .2 .8 1 .1 .7z"/>', 'clipPathUnits="objectBoundingBox"')}<g ${BY_C} transform="rotate(8)"><path d="M12 4h30M12 9h30M12 14h30M12 19h30M12 24h30"/><circle cx="40" cy="20" r="8"/><g transform="translate(-5 9) scale(.5)"><rect x="30" y="20" width="40" height="15"/></g></g>`,
  ),
  'in parts of the box, with a transform': page(
    `${clip('<rect width=".5" height=".5"/>', 'clipPathUnits="objectBoundingBox" transform="translate(6 3)"')}<path ${BY_C} d="M10 5L50 5 50 33 10 33zM10 5L50 33M50 5L10 33M10 19H50M30 5V33"/>`,
  ),
  'in parts of a box without height': page(
    `${clip('<rect x=".2" y="-1" width=".5" height="3"/>', 'clipPathUnits="objectBoundingBox"')}<path ${BY_C} d="M5 20H55"/><path d="M5 30H55"/>`,
  ),
  'in parts of the box of a use': page(
    `<defs><g id="o"><path d="M0 0H20V15H0zM0 0L20 15M20 0L0 15"/></g></defs>${clip('<circle cx=".5" cy=".5" r=".45"/>', 'clipPathUnits="objectBoundingBox"')}<use href="#o" x="20" y="10" ${BY_C}/>`,
  ),

  // Clips in clips.
  'a clip within a clip': page(
    `${clip(SHAPE)}<clipPath id="d"><rect x="20" y="10" width="40" height="20"/></clipPath><g clip-path="url(#d)">${hatched(BY_C)}</g>`,
  ),
  'a clipPath that is clipped': page(
    `<clipPath id="d"><rect x="20" y="10" width="40" height="20"/></clipPath>${clip(SHAPE, 'clip-path="url(#d)"')}${hatched(BY_C)}`,
  ),
  'a child of a clipPath that is clipped': page(
    `<clipPath id="d"><rect x="20" y="10" width="40" height="20"/></clipPath>${clip(`<circle cx="10" cy="30" r="8"/><path clip-path="url(#d)" d="M30 3C70 3 50 40 30 36S0 3 30 3z" transform="translate(3 0)"/>`)}${hatched(BY_C)}`,
  ),
  'a use in a clipPath that is clipped': page(
    `<defs><circle id="o" cx="30" cy="20" r="14"/></defs><clipPath id="d"><rect x="20" y="10" width="40" height="20"/></clipPath>${clip('<use href="#o" x="-4" clip-path="url(#d)"/>')}${hatched(BY_C)}`,
  ),
  'a clipped copy, moved': page(
    `<defs><g id="o" ${BY_C}>${HATCH}</g></defs>${clip('<circle cx="12" cy="12" r="9"/>')}<use href="#o"/><use href="#o" x="30" y="12"/>`,
  ),
  'a use that is clipped': page(
    `<defs><g id="o">${HATCH}</g></defs>${clip('<circle cx="20" cy="18" r="14"/>')}<use href="#o" x="9" y="3" ${BY_C} transform="scale(1.2)"/>`,
  ),

  // References that are none.
  'an id that is missing': page(hatched('clip-path="url(#nowhere)"')),
  'an id of something else': page(`<rect id="c" x="9" y="9" width="20" height="20"/>${hatched(BY_C)}`),
  'a clip path that clips itself': page(
    `${clip(SHAPE, 'clip-path="url(#c)"')}${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  'a clip path whose child it clips': page(
    `${clip(`<circle cx="30" cy="20" r="12" ${BY_C}/>`)}${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  'two clip paths that clip one another, the other first': page(
    `${clip('<circle cx="35" cy="20" r="14"/>', 'clip-path="url(#d)"')}<clipPath id="d" ${BY_C}><circle cx="25" cy="20" r="14"/></clipPath>${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  'three that clip one another by way of a child': page(
    `<clipPath id="e"><circle cx="30" cy="15" r="14" clip-path="url(#d)"/></clipPath><clipPath id="d" clip-path="url(#e)"><circle cx="25" cy="20" r="14"/></clipPath>${clip('<circle cx="35" cy="20" r="14"/>', 'clip-path="url(#d)"')}${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  'two clip paths that clip one another': page(
    `<clipPath id="d" ${BY_C}><circle cx="25" cy="20" r="14"/></clipPath>${clip('<circle cx="35" cy="20" r="14"/>', 'clip-path="url(#d)"')}${hatched(BY_C)}<path d="M3 3h5"/>`,
  ),
  none: page(`${clip(SHAPE)}${hatched('clip-path="none"')}`),
  'a value that is wrong': page(`${clip(SHAPE)}${hatched('clip-path="nonsense(3)"')}`),

  // Viewports.
  'a nested svg': page(`<svg x="8" y="6" width="40" height="25">${HATCH}</svg>`),
  'a nested svg with a viewBox': page(
    `<svg x="8" y="6" width="40" height="25" viewBox="10 10 30 10">${HATCH}</svg>`,
  ),
  'a nested svg, sliced': page(
    `<svg x="8" y="6" width="40" height="25" viewBox="10 10 30 10" preserveAspectRatio="xMinYMid slice">${HATCH}</svg>`,
  ),
  'a nested svg that is turned': page(
    `<g transform="rotate(12 30 20)"><svg x="8" y="6" width="40" height="25">${HATCH}</svg></g>`,
  ),
  'overflow visible': page(`<svg x="8" y="6" width="30" height="20" overflow="visible">${HATCH}</svg>`),
  'overflow auto': page(`<svg x="8" y="6" width="30" height="20" overflow="auto">${HATCH}</svg>`),
  'overflow scroll': page(`<svg x="8" y="6" width="30" height="20" style="overflow:scroll">${HATCH}</svg>`),
  'a symbol': page(
    `<symbol id="s" viewBox="0 0 30 20">${HATCH}</symbol><use href="#s" x="4" y="3" width="25" height="30"/><use href="#s" x="32" y="3" width="25" height="12" transform="skewX(4)"/>`,
  ),
  'a symbol whose overflow shows': page(
    `<symbol id="s" viewBox="0 0 30 20" overflow="visible">${HATCH}</symbol><use href="#s" x="14" y="8" width="25" height="20"/>`,
  ),
  'a nested svg that is clipped': page(
    `${clip('<circle cx="12" cy="9" r="12"/>')}<svg x="8" y="6" width="40" height="25" viewBox="0 0 20 20" ${BY_C}>${HATCH}</svg>`,
  ),
  'viewports within viewports': page(
    `<svg x="5" y="5" width="40" height="30"><svg x="10" y="-5" width="50" height="20" viewBox="0 0 60 40">${HATCH}</svg></svg>`,
  ),

  // The page.
  'lines past every edge': page('<circle cx="30" cy="20" r="24"/><path d="M-9 -9L70 50M59 -5V45M1 20H99"/>'),
  'the page of a viewBox that fits': page(HATCH, 'width="60mm" height="40mm" viewBox="5 5 20 30"'),
  'the page of a viewBox, sliced': page(
    HATCH,
    'width="60mm" height="40mm" viewBox="5 5 30 30" preserveAspectRatio="xMidYMid slice"',
  ),
  'a page whose overflow is said to show': page(HATCH, 'width="30mm" height="20mm" overflow="visible"'),
  'a page that is turned': page(HATCH, 'width="240" height="160" viewBox="0 0 60 40" transform="rotate(12)"'),
  'a page that is moved': page(
    HATCH,
    'width="240" height="160" viewBox="0 0 60 40" transform="translate(30 20)"',
  ),
  'children whose conditions do not hold': page(
    `${clip('<circle cx="12" cy="20" r="9" systemLanguage="xx"/><circle cx="48" cy="20" r="9" systemLanguage="en"/>')}${hatched(BY_C)}`,
  ),
  'a display that a child of a clipPath inherits not, a visibility that it does': page(
    `<g display="none" visibility="hidden">${clip('<circle cx="12" cy="20" r="9"/><circle cx="48" cy="20" r="9" visibility="visible"/>')}</g>${hatched(BY_C)}`,
  ),
  'lengths in em of where the clipPath stands': page(
    `<g font-size="4">${clip('<rect x="2em" y="1em" width="8em" height="5em"/>')}</g><g font-size="9">${hatched(BY_C)}</g>`,
  ),
  'a transform in a style, about the middle': page(
    `${clip('<rect x="15" y="10" width="30" height="20" style="transform-box:fill-box;transform-origin:center;transform:rotate(30deg)"/>')}${hatched(BY_C)}`,
  ),
  'a frame on the edge of the page': page('<path d="M0 0H60V40H0z"/><path d="M-3 0H63M0 -3V43"/>'),

  // Basic shapes.
  'inset()': page(
    `<g style="clip-path:inset(10% 5px 3px 20%)"><path d="M5 5H55V35H5zM5 5L55 35M5 35L55 5"/></g>`,
  ),
  'inset() with round corners': page(
    `<path stroke="none" style="clip-path:inset(2px 3px round 8px 3px)" d="M0 0"/><path style="clip-path:inset(2px 3px round 8px 3px) fill-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35M4 8H56"/>`,
  ),
  'circle()': page(
    `<path style="clip-path:circle(30%)" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'circle() at a place': page(
    `<path style="clip-path:circle(12px at 30% right) , none" d="M5 5H55"/><path style="clip-path:circle(12px at left 30%) fill-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'ellipse()': page(
    `<path style="clip-path:ellipse(19px 30% at 42% 50%) fill-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'polygon()': page(
    `<path style="clip-path:polygon(evenodd, 0 0, 100% 0, 20px 25px, 50% -5px, 10% 100%) fill-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'path()': page(
    `<path style="clip-path:path('M5 5H30A12 12 0 0 1 20 25z') fill-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'polygon() in the view-box': page(
    `<path style="clip-path:polygon(10% 10%, 90% 30%, 50% 95%) view-box" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
  'a box alone': page(`<g style="clip-path:fill-box"><path d="M15 5H55V35H15zM5 5L55 35M5 35L55 5"/></g>`),
  'a wide line counts in the box of a shape': page(
    `<g style="clip-path:inset(25%)"><rect x="15" y="12" width="30" height="16" stroke-width="6" stroke-opacity="0"/><path d="M15 12H45V28H15zM15 12L45 28M15 20H45"/></g>`,
  ),
  'a wide line in the box of a shape, said to be the fill-box': page(
    `<g style="clip-path:inset(25%) fill-box"><rect x="15" y="12" width="30" height="16" stroke-width="6" stroke-opacity="0"/><path d="M15 12H45V28H15zM15 12L45 28M15 20H45"/></g>`,
  ),
  'the outermost svg is clipped': page(
    HATCH,
    'width="240" height="160" viewBox="0 0 60 40" style="clip-path:circle(30px at 100px 60px)"',
  ),
  'the outermost svg is clipped by a clipPath': page(
    `${clip('<circle cx="30" cy="20" r="18"/>')}${HATCH}`,
    'width="240" height="160" viewBox="0 0 60 40" clip-path="url(#c)"',
  ),
  'a use that is clipped in parts of its box': page(
    `<defs><g id="o"><path d="M0 0H20V15H0zM0 0L20 15M20 0L0 15"/></g></defs>${clip('<rect width=".5" height=".5"/>', 'clipPathUnits="objectBoundingBox" transform="translate(4 2)"')}<use href="#o" x="20" y="10" ${BY_C}/>`,
  ),
  'a nested svg that is clipped in parts of its box': page(
    `${clip('<circle cx=".5" cy=".5" r=".4"/>', 'clipPathUnits="objectBoundingBox"')}<svg x="8" y="6" width="40" height="25" viewBox="0 0 20 20" ${BY_C}><path d="M2 2H18V16H2zM2 2L18 16M18 2L2 16"/></svg>`,
  ),
  'a symbol that is clipped': page(
    `${clip('<circle cx="14" cy="9" r="7"/>')}<symbol id="s" viewBox="0 0 30 20" ${BY_C}>${HATCH}</symbol><use href="#s" x="14" y="8" width="25" height="20"/>`,
  ),
  'a shape in an attribute': page(
    `<path clip-path="polygon(0 0, 100% 0, 50% 100%)" d="M5 5H55V35H5zM5 5L55 35M5 35L55 5M5 20H55M30 5V35"/>`,
  ),
};
