/**
 * The system colours of CSS Color Module Level 4, §6.2, and the deprecated ones of its appendix, as `rrggbb`,
 * as a browser shows them in light mode where it is not told otherwise (Chromium 156 on Linux).
 */
export const SYSTEM_COLOURS: ReadonlyMap<string, string> = new Map(
  `
  accentcolor 0075ff, accentcolortext ffffff, activetext ff0000, buttonborder 000000,
  buttonface efefef, buttontext 000000, canvas ffffff, canvastext 000000, field ffffff,
  fieldtext 000000, graytext 808080, highlight 0041c6, highlighttext ffffff, linktext 0000ee,
  mark ffff00, marktext 000000, selecteditem 1967d2, selecteditemtext ffffff, visitedtext 551a8b,
  activeborder 000000, activecaption ffffff, appworkspace ffffff, background ffffff,
  buttonhighlight efefef, buttonshadow efefef, captiontext 000000, inactiveborder 000000,
  inactivecaption ffffff, inactivecaptiontext 808080, infobackground ffffff, infotext 000000,
  menu ffffff, menutext 000000, scrollbar ffffff, threeddarkshadow 000000, threedface efefef,
  threedhighlight 000000, threedlightshadow 000000, threedshadow 000000, window ffffff,
  windowframe 000000, windowtext 000000`
    .trim()
    .split(/,\s+/)
    .map((entry) => entry.split(' ') as [string, string]),
);
