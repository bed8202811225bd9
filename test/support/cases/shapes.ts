import { type Cases, page } from './make.ts';

export const SHAPES: Cases = {
  'every shape': page(
    '<line x1="1" y1="2" x2="30" y2="40"/><rect x="4" y="5" width="30" height="20"/><circle cx="40" cy="30" r="9"/><ellipse cx="70" cy="40" rx="20" ry="7"/><polyline points="0,0 10,5 20,0"/><polygon points="50 50 60,55 70 , 50"/>',
  ),
  'rect with both radii': page('<rect x="4" y="5" width="30" height="20" rx="9" ry="3"/>'),
  'rect with one radius': page('<rect x="4" y="5" width="30" height="20" ry="6"/>'),
  'rect with radii too large': page(
    '<rect x="4" y="5" width="30" height="20" rx="50" ry="4"/><rect x="44" y="5" width="30" height="20" rx="50"/>',
  ),
  'rect with one radius that both sides bound': page(
    '<rect x="5" y="5" width="50" height="20" rx="20"/><rect x="65" y="5" width="50" height="20" ry="20"/>',
  ),
  'rect with a radius of 0': page('<rect x="4" y="5" width="30" height="20" rx="0" ry="6"/>'),
  'rect with a negative radius': page(
    '<rect x="4" y="5" width="30" height="20" rx="-3" ry="6"/><rect x="50" y="5" width="30" height="20" rx="-5" ry="-5"/>',
  ),
  'rect with a radius of auto': page('<rect width="20" height="10" rx="auto" ry="3"/>'),
  'rect without a side': page('<rect x="5" y="5" height="20"/><rect x="5" y="5" width="auto" height="20"/>'),
  'rect with a negative side': page('<rect x="5" y="5" width="-5" height="20"/>'),
  'shapes without size': page(
    '<rect x="4" y="5" width="0" height="20"/><circle cx="9" cy="9" r="0"/><ellipse cx="9" cy="9" rx="0" ry="3"/><circle cx="9" cy="9" r="-3"/>',
  ),
  'ellipse with one radius': page('<ellipse cx="40" cy="30" rx="12"/>'),
  'ellipse with auto in a style': page('<ellipse cx="40" cy="30" ry="12" style="rx:auto"/>'),
  'ellipse with auto': page('<ellipse cx="50" cy="50" rx="auto" ry="20"/>'),
  'ellipse with a negative radius': page('<ellipse cx="50" cy="50" rx="-5" ry="20"/>'),
  'circle without a middle': page('<circle r="20"/>'),
  'shapes by style': page(
    '<circle style="cx: 40px; cy: 30px; r: 12px"/><rect style="x:80px;y:10px;width:30px;height:20px;rx:5px"/>',
  ),
  'shapes by style, without units': page('<rect style="x:5;width:30" y="5" width="20" height="10"/>'),
};

export const POINTS: Cases = {
  'points that are odd': page('<polyline points="0,0 10,5 20,0 7"/><polygon points="0,50 10,55 20,50 7"/>'),
  'points with an error': page(
    '<polyline points="0,0 10,5 x 20,0"/><polygon points="0,50 10,55 20,70 y 20,50"/>',
  ),
  'points with an error at once': page('<polyline points="x 0,0 10,5"/>'),
  'points with units': page('<polyline points="0,0 10px,5 20,0"/>'),
  'points with two commas': page('<polyline points="0,0,,10,5 20,0"/>'),
  'points with a comma before and after': page(
    '<polyline points=",0,0 10,5"/><polyline points="0,9 10,5,"/>',
  ),
  'points that are packed': page('<polyline points="1e1-5.5.5-3+4 1E1,2"/>'),
  'points in lines and tabs': page('<polyline points="0,0\n10,5\t20,0&#10;30 10"/>'),
  'no points': page('<polyline points=""/><polygon points=" "/><polyline/>'),
  'polygon of one point and of two': page('<polygon points="5 5"/><polygon points="5 5 20 30"/>'),
};

export const DOTS: Cases = {
  'round dots': page(
    '<path stroke-linecap="round" d="M10 10zM20 20h0M30 30L30 30M40 40M50 50h.01M60 60a5 5 0 1 1 0 0"/>',
  ),
  'butt dots': page('<path d="M10 10zM20 20h0M30 30L30 30M40 40M50 50h.01"/>'),
  'square dots': page('<path stroke-linecap="square" d="M10 10zM20 20h0M30 30h5"/>'),
  'dots of curves': page(
    '<g stroke-linecap="round"><path d="M10 10l0 0 0 0"/><path d="M30 10c0 0 0 0 0 0"/><path d="M50 10q0 0 0 0z"/></g>',
  ),
  'dots and lone moves': page(
    '<g stroke-linecap="round"><path d="M10 10zz M20 20zL30 30"/><path d="M50 10L60 20M70 30"/><path d="M10 50M20 60m5 5"/></g>',
  ),
  'lines that are dots': page(
    '<line x1="5" y1="5" x2="5" y2="5" stroke-linecap="round"/><line x1="15" y1="5" x2="15" y2="5" stroke-linecap="square"/><line x1="25" y1="5" x2="25" y2="5"/>',
  ),
  'shapes that are dots': page(
    '<g stroke-linecap="round"><polygon points="60 60"/><polyline points="60 60"/><polyline points="6 6 6 6"/><line x1="60" x2="60" y1="9" y2="9"/><rect width="0" height="0"/><circle r="0"/></g>',
  ),
  'a lone z after m': page('<path stroke-linecap="round" d="M10 10h9zm5 5zm3 3"/>'),
  'dots under transforms': page(
    '<g stroke-linecap="round" transform="rotate(20)scale(2 .5)"><path d="M20 20h0"/><use href="#d" x="9"/><path id="d" d="M30 40z"/></g>',
  ),
};
