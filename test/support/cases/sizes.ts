import { type Cases, LINE, page, root, SQUIGGLE } from './make.ts';

const ALIGNMENTS = ['Min', 'Mid', 'Max'].flatMap((x) => ['Min', 'Mid', 'Max'].map((y) => `x${x}Y${y}`));

export const ROOT_SIZES: Cases = {
  'no viewBox': page(LINE),
  'size in mm': root('width="96mm" height="48mm" viewBox="0 0 96 48"', SQUIGGLE),
  'size in inches': root('width="2in" height="1.5in" viewBox="0 0 40 30"', SQUIGGLE),
  'size in pt and pc': root('width="72pt" height="6pc" viewBox="0 0 96 96"', SQUIGGLE),
  'size in cm, no viewBox': root('width="5cm" height="4cm"', LINE),
  'size in q': root('width="200Q" height="160q" viewBox="0 0 50 40"', SQUIGGLE),
  'size in em': root('width="20em" height="10em" font-size="10" viewBox="0 0 50 50"', SQUIGGLE),
  'size in rem': root('width="12rem" height="10rem" viewBox="0 0 50 50"', SQUIGGLE),
  'size in a style': root('style="width:200px;height:100px" viewBox="0 0 50 50"', SQUIGGLE),
  'size in a style, over attributes': root(
    'width="10" height="10" style="width:2in;height:100px" viewBox="0 0 50 50"',
    SQUIGGLE,
  ),
  'user units of a nanometre': root(
    'width="50mm" height="40mm" viewBox="100000000 80000000 50000000 40000000" stroke-width="100000"',
    '<path d="M105000000 85000000h30000000v20000000"/><polyline points="110000000,90000000 140000000,115000000"/>',
  ),
};

export const VIEW_BOXES: Cases = {
  'viewBox of another shape': root('width="200" height="100" viewBox="0 0 50 50"', SQUIGGLE),
  'viewBox with an origin': root('width="96" height="96" viewBox="-10 -20 48 48"', SQUIGGLE),
  'viewBox with commas': root('width="200" height="100" viewBox=" 0 , 0 5e1,50 "', SQUIGGLE),
  'viewBox of three numbers': root('width="200" height="100" viewBox="0 0 50"', SQUIGGLE),
  'viewBox of five numbers': root('width="200" height="100" viewBox="0 0 50 50 50"', SQUIGGLE),
  'viewBox with units': root('width="200" height="100" viewBox="0 0 50px 50px"', SQUIGGLE),
  'viewBox with a negative side': root('width="200" height="100" viewBox="0 0 -50 50"', SQUIGGLE),
  'viewBox of nothing': root('width="200" height="100" viewBox=""', SQUIGGLE),
  'preserveAspectRatio none': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="none"',
    SQUIGGLE,
  ),
  ...Object.fromEntries(
    ALIGNMENTS.flatMap((align) =>
      ['meet', 'slice'].map((mode) => [
        `preserveAspectRatio ${align} ${mode}`,
        root(`width="200" height="100" viewBox="0 0 50 70" preserveAspectRatio="${align} ${mode}"`, SQUIGGLE),
      ]),
    ),
  ),
  'preserveAspectRatio in a tall page': root(
    'width="100" height="200" viewBox="0 0 50 50" preserveAspectRatio="xMinYMax"',
    SQUIGGLE,
  ),
  'preserveAspectRatio unknown': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="middle"',
    SQUIGGLE,
  ),
  'preserveAspectRatio in capitals': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="XMINYMIN"',
    SQUIGGLE,
  ),
  'preserveAspectRatio with defer': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="defer xMaxYMin"',
    SQUIGGLE,
  ),
  'preserveAspectRatio with a word too many': root(
    'width="200" height="100" viewBox="0 0 50 50" preserveAspectRatio="xMinYMin meet x"',
    SQUIGGLE,
  ),
};

export const UNITS: Cases = {
  'lengths in units': page(
    '<rect x="1mm" y="2pt" width="1cm" height=".5in" rx="1pc"/><line x1="0" y1="1em" x2="5em" y2="40" font-size="20"/>',
  ),
  'units in capitals': page('<rect x="5PX" y="5MM" width="2CM" height="10Pt"/>'),
  'lengths with signs, exponents and space': page(
    '<rect x=" +5 " y="-5" width="2e+1" height="100E-1"/><rect x="1e1" y="5E0" width=" 20 " height="10"/>',
  ),
  'lengths that are none': page(
    '<rect x="5q5" y="abc" width="20" height="10"/><circle cx="9x" cy="9" r="5"/><line x1="bad" x2="5" y2="5"/>',
  ),
  'a space before the unit': page('<rect x="5 px" y="5" width="20" height="10"/>'),
  'a trailing point': page('<rect x="5." y="5" width="20" height="10"/>'),
  'units of the root font': page('<line x1="1rem" x2="5rem" y2="3rem" y1="0"/>', 'font-size="10"'),
  'units of the font, inherited': page(
    '<g font-size="8"><g font-size="2em"><line x1="1em" x2="4em" y2="2em"/></g><line y1="1em" x2="50" font-size="150%"/></g>',
  ),
  'units of the letters': page('<line x1="1ex" x2="5ch" y2="3ex" y1="0"/>'),
  'units of the window': page('<rect x="1vw" y="1vh" width="10vmin" height="1vmax"/>'),
  'lengths in percent': page(
    '<rect x="10%" y="10%" width="50%" height="25%"/><circle cx="50%" cy="50%" r="10%"/><line x1="0" y1="0" x2="100%" y2="50%"/>',
  ),
  'radii in percent': page(
    '<ellipse cx="20%" cy="20%" rx="10%" ry="5%"/><rect x="5" y="5" width="50" height="40" rx="10%"/>',
  ),
  'percent of a viewBox': root(
    'width="200" height="100" viewBox="10 10 60 40"',
    '<circle cx="50%" cy="50%" r="25%"/>',
  ),
  'percent of a nested viewport': page(
    '<svg x="10%" y="10%" width="50%" height="50%"><circle cx="50%" cy="50%" r="10%"/><line x2="100%" y2="100%"/></svg>',
  ),
  'percent under a transform': page('<g transform="scale(.5)"><line x2="100%" y2="100%"/></g>'),
  'percent in a copied symbol': page(
    '<symbol id="s" viewBox="0 0 40 20"><line x2="100%" y2="100%"/></symbol><use href="#s" width="50%" height="50%" x="10%" y="20%"/>',
  ),
  'sums in attributes and styles': page(
    '<rect x="calc(5px + 10%)" y="5" width="20" height="10"/><rect style="width:calc(20px*2)" y="25" height="10"/>',
  ),
};
