import { type Cases, page, SQUIGGLE } from './make.ts';

export const PATH_SYNTAX: Cases = {
  'path: curves of all kinds': page(SQUIGGLE),
  'path: packed numbers': page('<path d="M10-5.5.5 20l1e1-1E+1.5.5-.5e1 3"/>'),
  'path: signs': page('<path d="M+10+10L+20+30-.5-.5h+3v-.5"/>'),
  'path: exponents': page('<path d="M1e1 1E1l1.5e1 0e5L4e+1 4e1 1e-1 5"/>'),
  'path: joined flags': page(
    '<path d="M20 40a15 10 0 0110 10 15 10 30 1020-5"/><path d="M10 90a20 10 0 0020 5a20 10 0 1130-5 5 5 0 01.5.5"/>',
  ),
  'path: on after z': page('<path d="M10 10h20v20z l-5 40 m5 5 h9 v-8 z z h3"/>'),
  'path: several m': page('<path d="m10 10 5 0 m5 5 5 5 10 0 m 0 10 z m 5 5"/>'),
  'path: pairs after M and m': page(
    '<path d="M10 10 20 20 30 10m5 5 5 5 5-5"/><path d="m10 50 20 0z m5 5 10 10"/>',
  ),
  'path: many h and v': page('<path d="M10 10h5 5 5v5 5H5V5"/>'),
  'path: smooth after others': page(
    '<path d="M10 10S20 30 40 10T60 10 80 20Q90 0 100 10S110 20 120 5"/><path d="M10 50q5-10 10 0t10 0 10 5 10-5T90 50"/>',
  ),
  'path: repeated arcs': page('<path d="M10 30a5 8 30 0 0 10 5 5 8 30 1 1 10 5"/>'),
  'path: a loop of one cubic': page('<path d="M30 30c40 40 -40 40 0 0"/>'),
  'path: white space of every kind': page('<path d="&#9;M&#10;10&#13;10 L20,30,&#10;40 50"/>'),
  'path: commas before commands': page(
    '<path d="M0 0,L9 9"/><path d="M0 25 L9 29, M20 40 L30 50,"/><path d="M50 0L59 9L70 0,z"/>',
  ),
  'path: none': page('<path d="none"/><path/><path d=""/>'),
  'path: closed within a hair': page('<path d="M10 10l.1.2.1.2z"/>'),
  'path by style': page('<path style="d: path(&quot;M10 10H50V40z&quot;)"/>'),
  'path of none by style': page('<path d="M10 10L20 20" style="d:none"/>'),
};

export const ARCS: Cases = {
  'arc: a radius of 0': page('<path d="M10 10A0 5 0 0 1 40 30"/>'),
  'arc: radii too small': page('<path d="M10 10A5 3 20 0 1 60 30"/><path d="M10 60a1e-9 1e-9 0 0 0 30 15"/>'),
  'arc: signed radii': page('<path d="M10 10A-25 -15 20 1 1 60 30"/><path d="M10 90a-20 +10 0 0 1 20 5"/>'),
  'arc: to where it is': page('<path d="M10 10A25 15 20 1 1 10 10L40 30"/>'),
  'arc: half turns': page('<path d="M10 30a15 15 0 0 1 30 0"/><path d="M10 90a15 15 0 1 0 30 0"/>'),
  'arc: turned by more than once': page(
    '<path d="M10 30a20 8 750 0 0 30 15"/><path d="M10 90a20 8 -45 1 0 30 15"/>',
  ),
  'arc: mirrored': page('<path transform="scale(1 -1) translate(0 -80)" d="M10 40A30 20 25 0 1 60 50"/>'),
  'arc: stretched and skewed': page(
    '<g transform="translate(20 0)skewX(30)scale(1.5 .6)"><path d="M10 40A30 20 25 1 1 60 50"/><circle cx="50" cy="90" r="20"/><rect x="5" y="120" width="60" height="40" rx="12"/></g>',
  ),
  'arc: long and thin': page('<path d="M10 40A80 .5 10 1 1 90 45"/>'),
};

export const PATH_ERRORS: Cases = {
  'path error: a letter': page('<path d="M10 10L30 40 50 x60 70"/><path d="M10 50L20 60K30 70L40 80"/>'),
  'path error: a flag': page('<path d="M10 10L30 40A5 5 0 2 1 60 70L5 5"/>'),
  'path error: a flag with a sign or a point': page(
    '<path d="M10 50a20 10 0 +0 1 20 5"/><path d="M10 90h9a20 10 0 0 1. 20 5"/>',
  ),
  'path error: no M at first': page('<path d="L10 10 20 20"/><path d=",M0 0L9 9"/><path d="M,0 0L9 9"/>'),
  'path error: two commas': page('<path d="M10 10L20 20,,30 30"/>'),
  'path error: numbers after z': page('<path d="M10 10L30 40z 50 60L70 70"/>'),
  'path error: a comma after z': page('<path d="M0 0L9 9L20 0z,L50 50"/>'),
  'path error: half a pair': page('<path d="M10"/><path d="M10 10 20"/><path d="M10 50 L20 60 30"/>'),
  'path error: half a curve': page('<path d="M10 10C20 20 30 30 40 40 50 50 60"/>'),
  'path error: half an arc': page('<path d="M10 10L30 40A5 5 0 0 1 60"/>'),
  'path error: a trailing point': page('<path d="M10 10L30 40L50. 60"/><path d="M10 80L. 20"/>'),
  'path error: an exponent of nothing': page('<path d="M10 10L20 20l1e 5"/><path d="M10 50L20 60l1e+ 5"/>'),
  'path error: a number out of range': page('<path d="M10 10L20 20L1e400 5L30 30"/>'),
  'path error: foreign characters': page(
    '<path d="M10 10&#160;L20 20"/><path d="M10 50/* x */L20 60"/><path d="M10 90L20 99#"/>',
  ),
  'path error: no number': page('<path d="M10 10L30 40L NaN 5"/><path d="M10 50LInfinity 9"/>'),
};
