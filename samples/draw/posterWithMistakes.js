import { line, path, polyline, svg } from './svg.js';

/** Eight by eight pixels of grey, one bit each: a PNG of our own making. */
const CHEQUERS =
  'iVBORw0KGgoAAAANSUhEUgAAAAgAAAAIAQAAAADsdIMmAAAADklEQVR42mMIZVjFgIQBHpwD/XAVyZAAAAAASUVORK5CYII=';

/** A poster as it comes out of a hurried evening: each mistake is there once, and every one has its message. */
export function posterWithMistakes() {
  const kite = [
    [60, 18],
    [84, 46],
    [60, 90],
    [36, 46],
    [60, 18],
  ];
  return svg(
    100,
    140,
    'A kite day, with mistakes',
    [
      // Drawn well.
      polyline(kite),
      line(60, 18, 60, 90),
      line(36, 46, 84, 46),
      path('M60 90C50 98 70 104 58 112C48 119 40 112 30 120'),
      // Copied and left lying on itself: the frame of the kite once more.
      '<g id="pasted-twice">',
      polyline(kite),
      '</g>',
      // The ground runs off the page on the right.
      '<path id="ground" d="M6 128C30 120 60 134 106 124"/>',
      // Notes on a layer that was switched off.
      '<g id="notes" display="none">',
      line(10, 10, 90, 10),
      line(10, 14, 70, 14),
      '</g>',
      // A sun with a fill and no stroke: seen on a screen, nothing for a pen.
      '<circle id="sun" cx="22" cy="24" r="9" fill="#f2b134" stroke="none"/>',
      // Lettering as text.
      '<text id="lettering" x="10" y="137" font-size="5" fill="#20344a" stroke="none">kite day at the long meadow</text>',
      // A picture.
      `<image id="stamp" x="80" y="104" width="10" height="10" href="data:image/png;base64,${CHEQUERS}"/>`,
      // A string of no width.
      '<path id="string" stroke-width="0" d="M30 120C28 122 27 124 26 127"/>',
    ],
    { stroke: '#20344a' },
  );
}
