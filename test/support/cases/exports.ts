/**
 * Drawings as other programs write them, made up: what each kind of program is known to do stands in it,
 * their content is invented. Lines are thin, so that pictures tell where they run.
 */
export interface Export {
  readonly name: string;
  readonly caps: 'butt' | 'round';
  readonly text: string;
}

const numbers = (count: number) => Array.from({ length: count }, (_, i) => i);
const list = (count: number, make: (i: number) => string, gap = '\n') => numbers(count).map(make).join(gap);
const fixed = (v: number, digits = 3) => v.toFixed(digits);
/** A wavy line through a box, not the same for two seeds. */
const wave = (seed: number, i: number, size: number) =>
  size * (0.5 + 0.3 * Math.sin(seed + 0.31 * i) + 0.15 * Math.sin(2.7 * seed + 0.83 * i));

const XLINK = 'xmlns:xlink="http://www.w3.org/1999/xlink"';
const SVG = 'xmlns="http://www.w3.org/2000/svg"';

const map = `<?xml version="1.0" encoding="UTF-8"?>
<svg ${SVG} ${XLINK} width="180mm" height="120mm" viewBox="0 0 180 120" version="1.2" baseProfile="tiny">
<style>.road{fill:none;stroke:#c33;stroke-width:.35}.track{stroke-dasharray:2 1}.water{fill:#cef;stroke:#26c;stroke-width:.25}.grid line{stroke:#999;stroke-width:.15}</style>
<defs><clipPath id="frame"><rect x="10" y="10" width="160" height="100"/></clipPath>
<symbol id="town" viewBox="-2 -2 4 4" overflow="visible"><circle r="1.2" fill="none" stroke="#000" stroke-width=".3"/></symbol></defs>
<g id="graticule" class="grid" clip-path="url(#frame)">
${list(9, (i) => `<line x1="${20 * i}" y1="0" x2="${20 * i + 6}" y2="120"/><line x1="0" y1="${15 * i}" x2="180" y2="${15 * i + 3}"/>`)}
</g>
<g id="water" clip-path="url(#frame)">${list(3, (k) => `<path class="water" d="M${list(24, (i) => `${fixed(90 + (50 + 9 * k) * Math.cos(i / 3.82) * (0.6 + 0.2 * Math.sin(3 * i + k)))} ${fixed(60 + 40 * Math.sin(i / 3.82))}`, 'L')}z"/>`)}</g>
<g id="roads" clip-path="url(#frame)">${list(6, (k) => `<polyline class="road${k % 2 ? ' track' : ''}" points="${list(30, (i) => `${fixed(6.2 * i)},${fixed(wave(k, i, 120))}`, ' ')}"/>`)}</g>
<g id="towns">${list(7, (k) => `<use xlink:href="#town" x="${fixed(18 + 22 * k)}" y="${fixed(wave(k, 9, 110))}" width="4" height="4"/><text x="${20 + 22 * k}" y="20" font-size="3" fill="#000">Place ${k}</text>`)}</g>
<rect x="10" y="10" width="160" height="100" fill="none" stroke="#000" stroke-width=".4"/>
</svg>`;

const chart = `<svg class="main" ${SVG} width="700" height="450" style="background: white;">
<defs><g class="clips"><clipPath id="clip1-xy" class="plotclip"><rect width="540" height="270"/></clipPath></g></defs>
<g class="bg"><rect x="80" y="100" width="540" height="270" style="stroke-width: 0; fill: rgb(229, 236, 246); fill-opacity: 1;"/></g>
<g class="grid" style="fill:none">${list(6, (i) => `<path transform="translate(${80 + 90 * i},0)" d="M0,100v270" style="stroke: rgb(170, 170, 170); stroke-width: 1px;"/>`)}</g>
<g class="plot" transform="translate(80,100)" clip-path="url('#clip1-xy')"><g class="scatter">
${list(4, (k) => `<path class="line" style="vector-effect: none; fill: none; stroke: rgb(${60 * k}, 110, ${250 - 60 * k}); stroke-opacity: 1; stroke-width: 1.5px;${k === 2 ? ' stroke-dasharray: 9px, 9px;' : ''}" d="M${list(40, (i) => `${fixed(15 * i - 20, 2)},${fixed(1.3 * wave(k + 1, i, 270) - 30, 2)}`, 'L')}"/>`)}
${list(12, (i) => `<path class="point" transform="translate(${48 * i},${fixed(wave(1, 3 * i, 270), 2)})" d="M4,0A4,4 0 1,1 0,-4A4,4 0 0,1 4,0Z" style="opacity: 1; stroke: rgb(20, 20, 20); stroke-width: 1px; fill: rgb(255, 255, 255);"/>`)}
</g></g>
<path class="xlines" style="fill: none; stroke: rgb(0,0,0); stroke-width: 1px;" d="M79.5,370.5H620.5M79.5,99.5V370.5${list(6, (i) => `M${80 + 90 * i},370.5v5`, '')}"/>
<g class="text"><text x="350" y="420" text-anchor="middle">steps</text></g></svg>`;

const notebook = `<?xml version="1.0" encoding="utf-8" standalone="no"?>
<!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd">
<svg ${XLINK} width="432pt" height="288pt" viewBox="0 0 432 288" ${SVG} version="1.1">
<metadata/>
<defs><style type="text/css">*{stroke-linejoin: round; stroke-linecap: butt}</style></defs>
<g id="figure_1"><g id="patch_1"><path d="M 0 288 L 432 288 L 432 0 L 0 0 z" style="fill: #ffffff"/></g>
<g id="axes_1">${list(3, (k) => `<g id="line2d_${k}"><path d="M ${list(60, (i) => `${fixed(54 + 5.6 * i, 6)} ${fixed(36 + wave(k, i, 180), 6)}`, '\nL ')}" clip-path="url(#p0f)" style="fill: none; stroke: #${['1f77b4', 'd62728', '2ca02c'][k]}; stroke-width: 1.5;${['', ' stroke-dasharray: 5.55,2.4; stroke-dashoffset: 0;', ' stroke-dasharray: 9.6,2.4,1.5,2.4; stroke-dashoffset: 3'][k]}"/></g>`)}
<g id="ticks"><defs><path id="m5a" d="M 0 0 L 0 3.5 " style="stroke: #000000; stroke-width: 0.8"/><path id="m7b" d="M -3 3 L 3 -3 M -3 -3 L 3 3" style="stroke: #9467bd"/></defs>
<g>${list(7, (i) => `<use xlink:href="#m5a" x="${fixed(54 + 50 * i, 6)}" y="256.32" style="stroke: #000000; stroke-width: 0.8"/>`)}</g>
<g clip-path="url(#p0f)">${list(9, (i) => `<use xlink:href="#m7b" x="${fixed(34 + 48 * i, 6)}" y="${fixed(40 + wave(2, 2 * i, 190), 6)}" style="fill: #9467bd; stroke: #9467bd"/>`)}</g></g>
<g id="patch_2"><path d="M 54 252 L 388.8 252 L 388.8 34.56 L 54 34.56 z" style="fill: none; stroke: #000000; stroke-width: 0.8; stroke-linejoin: miter; stroke-linecap: square"/></g></g></g>
<defs><clipPath id="p0f"><rect x="54" y="34.56" width="334.8" height="217.44"/></clipPath></defs>
</svg>`;

const cad = `<?xml version="1.0"?>
<svg ${SVG} width="90mm" height="60mm" viewBox="0 0 90000000 60000000" preserveAspectRatio="xMidYMid meet" stroke-width="200000" stroke-linecap="butt" fill="none">
<g id="Outline" transform="matrix(1 0 0 -1 0 60000000)" stroke="black">
${list(5, (k) => `<path d="M ${5000000 + 16000000 * k} 8000000 L ${9000000 + 16000000 * k} ${20000000 + 5000000 * k}"/>\n<path d="M ${9000000 + 16000000 * k} ${20000000 + 5000000 * k} A 4000000 4000000 0 0 ${k % 2} ${15000000 + 16000000 * k} ${22000000 + 3000000 * k}"/>`)}
<path d="M 4000000 4000000 H 86000000 V 56000000 H 4000000 Z"/></g>
<g id="Hidden" stroke="#00f" stroke-dasharray="3000000 1000000">${list(6, (i) => `<path d="M ${6000000 + 13000000 * i},6000000 l 9000000,48000000"/>`)}</g>
</svg>`;

const converted = `<?xml version="1.0" encoding="UTF-8"?>
<svg ${SVG} ${XLINK} width="420pt" height="300pt" viewBox="0 0 420 300" version="1.1">
<defs><g>${list(3, (k) => `<symbol overflow="visible" id="glyph0-${k}"><path style="stroke:none;" d="M0 0h5v-7h-5z"/></symbol>`)}</g>
<clipPath id="clip1"><path d="M 30 30 L 390 30 L 390 230 L 30 230 Z M 30 30 "/></clipPath><clipPath id="clip2"><path clip-rule="evenodd" d="M 60 60 L 330 60 L 330 270 L 60 270 Z M 150 100 L 150 200 L 250 200 L 250 100 Z "/></clipPath></defs>
<g id="surface1"><rect x="0" y="0" width="420" height="300" style="fill:rgb(100%,100%,100%);fill-opacity:1;stroke:none;"/>
<g clip-path="url(#clip1)" clip-rule="nonzero">${list(5, (k) => `<path style="fill:none;stroke-width:1;stroke-linecap:butt;stroke-linejoin:miter;stroke:rgb(${20 * k}%,0%,40%);stroke-opacity:1;stroke-miterlimit:10;" d="M ${list(9, (i) => `${fixed(50 * i - 10, 4)} ${fixed(wave(k, 3 * i, 280), 4)}`, ' L ')}" transform="matrix(1,0,0,-1,0,300)"/>`)}</g>
<g clip-path="url(#clip2)">${list(14, (k) => `<path style="fill:none;stroke-width:8;stroke:rgb(0%,0%,0%);" d="M 0 ${200 * k} L 4200 ${200 * k + 900} " transform="matrix(0.1,0,0,0.1,0,-60)"/>`)}</g>
<g style="fill:rgb(0%,0%,0%);fill-opacity:1;">${list(6, (i) => `<use xlink:href="#glyph0-${i % 3}" x="${40 + 9 * i}" y="285"/>`)}</g>
<svg x="300" y="10" width="100" height="80" viewBox="0 0 10 8"><circle cx="5" cy="4" r="5" style="fill:none;stroke:rgb(0%,50%,0%);stroke-width:0.1"/></svg></g>
</svg>`;

const board = `<?xml version="1.0" standalone="no"?>
 <!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN"
 "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd">
<svg
  ${SVG}
  version="1.1"
  width="80.0000mm" height="60.0000mm" viewBox="0.0000 0.0000 80.0000 60.0000">
<title>board</title>
<g style="fill:#000000; fill-opacity:1.0;stroke:#000000; stroke-opacity:1.0;
stroke-linecap:round; stroke-linejoin:round;"
 transform="translate(0 0) scale(1 1)">
</g>
<g style="fill:none;
stroke:#C83434; stroke-width:0.3000; stroke-opacity:1;
stroke-linecap:round; stroke-linejoin:round;">
${list(9, (k) => `<path d="M${fixed(5 + 8 * k, 4)} 10.0000\nL${fixed(5 + 8 * k, 4)} ${fixed(20 + 2 * k, 4)}\n" />\n<path d="M${fixed(5 + 8 * k, 4)} ${fixed(20 + 2 * k, 4)} A4.0000 4.0000 0.0 0 1 ${fixed(9 + 8 * k, 4)} ${fixed(24 + 2 * k, 4)} " />`)}
</g>
<g style="fill:#0000C2; fill-opacity:0.0;
stroke:#0000C2; stroke-width:0.2000; stroke-opacity:1;
stroke-linecap:round; stroke-linejoin:round;">
${list(6, (k) => `<circle cx="${fixed(8 + 12 * k, 4)}" cy="48.0000" r="2.5000" />\n<path style="fill:none;stroke-dasharray:1.2,0.8" d="M${fixed(8 + 12 * k, 4)},52.0000\n${fixed(8 + 12 * k, 4)},58.0000\n${fixed(12 + 12 * k, 4)},58.0000\n" />`)}
<text x="10" y="5" textLength="9" font-size="2" opacity="0" stroke-opacity="0">N1</text>
<g class="stroked-text"><desc>N1</desc><path d="M10.0000 5.0000\nL10.0000 3.0000 L11.5000 5.0000 L11.5000 3.0000" /></g>
</g>
</svg>`;

const lettering = `<svg ${SVG} width="6in" height="2in" viewBox="0 0 576 192">
<g fill="none" stroke="black" stroke-width="30" stroke-linecap="round" stroke-linejoin="round">
${list(8, (k) => `<path transform="translate(${30 + 66 * k},140) scale(0.05,-0.05)" d="M100 0V${900 + 40 * k}M100 ${500 + 30 * k}Q300 ${900 - 20 * k} 500 500T800 ${100 * (k % 3)}${k % 2 ? 'M700 1100h0' : 'M700 1100l1e-3 0'}M-100 -200c300 -90 600 90 900 0" />`)}
</g></svg>`;

const editor = `<?xml version="1.0" encoding="utf-8"?>
<!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd" [
	<!ENTITY ns_svg "http://www.w3.org/2000/svg">
	<!ENTITY ns_xlink "http://www.w3.org/1999/xlink">
	<!ENTITY ns_tool "http://example.org/tool/1.0/">
	<!ENTITY st0 "fill:none;stroke:#231F20;stroke-width:0.5;">
	<!ATTLIST svg xmlns:xlink CDATA #FIXED "http://www.w3.org/1999/xlink">
	<!ATTLIST g tool:layer CDATA #IMPLIED>
]>
<svg version="1.1" id="base" xmlns:tool="&ns_tool;" xmlns="&ns_svg;" xmlns:xlink="&ns_xlink;" x="0px" y="0px" width="240px" height="160px" viewBox="0 0 240 160" enable-background="new 0 0 240 160" xml:space="preserve">
<switch><foreignObject requiredExtensions="&ns_tool;" x="0" y="0" width="1" height="1"><tool:dataRef xlink:href="#data"/></foreignObject>
<g tool:extraneous="self">
<g id="Cut" tool:layer="yes"><path style="&st0;" d="M20,20c10-15,30-15,40,0s30,15,40,0s30-15,40,0v60H20V20z"/><line fill="none" stroke="#ED1C24" stroke-miterlimit="10" x1="20" y1="100" x2="220" y2="140"/></g>
<g id="Score" tool:layer="yes" stroke-dasharray="4,3">${list(5, (i) => `<polyline style="&st0;" points="${20 + 40 * i},150 ${30 + 40 * i},${110 - 10 * i} ${50 + 40 * i},150 "/>`)}</g>
<g id="Notes" tool:layer="yes" display="none"><path style="&st0;" d="M0,0L240,160"/></g>
<g><g><defs><rect id="SVGID_1_" x="150" y="20" width="70" height="50"/></defs><clipPath id="SVGID_2_"><use xlink:href="#SVGID_1_" overflow="visible"/></clipPath><g clip-path="url(#SVGID_2_)">${list(8, (i) => `<ellipse fill="none" stroke="#0072BC" cx="185" cy="45" rx="${6 * i + 4}" ry="${4 * i + 3}"/>`)}</g></g></g>
</g></switch>
<tool:data id="data"><![CDATA[ <path d="M0 0h99"/> ]]></tool:data>
</svg>`;

const layered = `<?xml version="1.0" encoding="UTF-8" standalone="no"?>
<svg xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:svg="http://www.w3.org/2000/svg" ${SVG} ${XLINK} xmlns:e="http://example.org/editor" width="210mm" height="148mm" viewBox="0 0 210 148" version="1.1" id="svg8">
  <defs id="defs2"><e:perspective e:vp_x="0 : 74 : 1" id="p1"/><marker id="Arrow" orient="auto" style="overflow:visible"><path d="M 0,0 5,-5 -12,0 5,5 Z" style="fill:#000"/></marker></defs>
  <e:namedview id="base" pagecolor="#ffffff" e:zoom="0.98"/>
  <metadata id="m"><dc:title/></metadata>
  <g e:label="Layer 1" e:groupmode="layer" id="layer1" transform="translate(0,-149)">
    <path style="fill:none;stroke:#000000;stroke-width:0.26458332px;stroke-linecap:butt;stroke-linejoin:miter;stroke-opacity:1" d="m 20,180 c 30,-40 70,60 110,10 20,-30 50,-10 60,20" id="path1"/>
    <rect style="opacity:1;fill:none;stroke:#aa0000;stroke-width:0.5;stroke-dasharray:4, 2;stroke-dashoffset:1.5" id="rect2" width="60" height="35" x="20" y="230" ry="6" transform="rotate(-8,50,250)"/>
    <g id="g3" transform="matrix(0.8,0.2,-0.2,0.8,100,40)">${list(5, (i) => `<circle style="fill:none;stroke:#0000ff;stroke-width:.4" id="c${i}" cx="${30 + 14 * i}" cy="240" r="${5 + i}"/>`)}</g>
    <use x="0" y="0" xlink:href="#path1" id="use4" transform="translate(2,30)" width="100%" height="100%"/>
    <path style="fill:none;stroke:#000;stroke-width:.3;marker-end:url(#Arrow)" d="M 150,280 190,290" e:connector-curvature="0" id="path5"/>
  </g>
  <g e:groupmode="layer" id="layer2" e:label="Guides" style="display:none"><path style="stroke:#000" d="M 0,0 210,148"/></g>
</svg>`;

const diagram = `<svg ${SVG} ${XLINK} width="721px" height="421px" viewBox="-0.5 -0.5 721 421"><style><![CDATA[
.node rect, .node circle { fill: #eef; stroke: #93d; stroke-width: 1px; }
#diagram .edge > path { stroke: #333; fill: none }
.edge.soft path { stroke-dasharray: 3 3 }
text { font-family: sans-serif }
@media (prefers-color-scheme: dark) { .node rect { stroke: none } }
]]></style><defs><marker id="end" viewBox="0 0 10 10" refX="9" refY="5" markerWidth="6" markerHeight="6" orient="auto"><path d="M 0 0 L 10 5 L 0 10 z"/></marker><symbol id="box" viewBox="0 0 40 20" preserveAspectRatio="none"><path d="M1 1h38v18h-38zM1 6h38" fill="none" stroke="#080" stroke-width=".6"/></symbol></defs>
<g id="diagram">${list(5, (i) => `<g class="node" transform="translate(${40 + 130 * i},${60 + 50 * (i % 3)})"><rect rx="5" ry="5" x="-30" y="-20" width="90" height="40"/><g class="label"><foreignObject width="60" height="20"><div xmlns="http://www.w3.org/1999/xhtml">step ${i}</div></foreignObject></g></g><g class="edge${i % 2 ? ' soft' : ''}"><path d="M${100 + 130 * i},${60 + 50 * (i % 3)}C${130 + 130 * i},${60 + 50 * (i % 3)} ${100 + 130 * i},300 ${60 + 130 * i},320" marker-end="url(#end)"/></g>`)}
<a xlink:href="#x" target="_top"><g class="node"><circle cx="600" cy="340" r="30"/></g></a>
<use xlink:href="#box" x="40" y="340" width="160" height="60"/><use xlink:href="#box" x="240" y="330" width="60" height="70"/></g></svg>`;

const script = `<svg ${SVG} version="1.1" width="11in" height="8.5in" viewBox="0 0 1056 816" stroke="black" fill="none" stroke-linecap="round">
${list(24, (k) => `<polyline points="${list(80, (i) => `${fixed(528 + (40 + 14 * k) * Math.cos(i / 12.5) * (1 + 0.1 * Math.sin(5 * i + k)), 2)},${fixed(408 + (30 + 14 * k) * Math.sin(i / 12.5), 2)}`, ' ')}"/>`)}
${list(30, (i) => `<path d="M${20 + 34 * i} 20zM${20 + 34 * i} 40h0"/>`)}
</svg>`;

export const EXPORTS: readonly Export[] = [
  { name: 'a map', caps: 'butt', text: map },
  { name: 'a chart from a page', caps: 'butt', text: chart },
  { name: 'a plot from a notebook', caps: 'butt', text: notebook },
  { name: 'a construction in units of 1 nm', caps: 'butt', text: cad },
  { name: 'a page converted from a print format', caps: 'butt', text: converted },
  { name: 'a circuit board', caps: 'round', text: board },
  { name: 'lettering of single lines', caps: 'round', text: lettering },
  { name: 'an editor that keeps its own data beside', caps: 'butt', text: editor },
  { name: 'an editor with layers', caps: 'butt', text: layered },
  { name: 'a diagram', caps: 'butt', text: diagram },
  { name: 'a plotting script', caps: 'round', text: script },
];
