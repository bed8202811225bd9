import { type Cases, LINE, page, SQUIGGLE } from './make.ts';

const DEFINED = '<defs><path id="p" d="M1 1h9v9"/></defs>';

export const COPIES: Cases = {
  use: page(
    `${DEFINED}<use href="#p"/><use xlink:href="#p" x="20" y="30" transform="rotate(20)"/><use href="#missing"/>`,
  ),
  'use of a group': page(
    `<defs><g id="g" stroke="red" transform="translate(3 4)">${SQUIGGLE}${LINE}</g></defs><use href="#g"/><use href="#g" x="50" y="1cm" transform="rotate(9)"/>`,
  ),
  'use placed in percent and below 0': page(`${DEFINED}<use href="#p" x="50%" y="-10%"/>`),
  'use placed by a style': page(`${DEFINED}<use href="#p" style="x:20px;y:10px"/>`),
  'use with a size that does not matter': page(`${DEFINED}<use href="#p" width="0" height="10"/>`),
  'use with both kinds of href': page(
    `${DEFINED}<path id="q" d="M1 1v9"/><use href="#p" xlink:href="#q" x="20"/>`,
  ),
  'use of nothing': page(`<use href=""/><use href="#"/><use/>${LINE}`),
  'use of another file': page(`<use href="other.svg#p"/>${LINE}`),
  'use before what it uses': page('<use href="#p" x="30"/><path id="p" d="M1 1h9v9"/>'),
  'use of the first of two': page(
    '<path id="p" d="M1 1h9v9"/><path id="p" d="M1 30h50"/><use href="#p" x="30"/>',
  ),
  'use in use': page(
    `<defs><path id="p" d="M1 1h9v9"/><g id="q" transform="translate(5 5)"><use href="#p"/><use href="#p" x="20"/></g></defs><use href="#q"/><use href="#q" y="30" transform="scale(2)"/>`,
  ),
  'use of use': page(
    '<path id="p" d="M1 1h9v9"/><use id="u" href="#p" x="20"/><use id="v" href="#u" y="20"/><use href="#v" x="20" y="20" transform="scale(.5)"/>',
  ),
  'use with children': page(`${DEFINED}<use href="#p" x="20"><path d="M1 9h9"/></use>`),
  'use takes the style of its place': page(
    '<defs><path id="p" d="M1 1h9v9"/><path id="q" stroke="red" d="M1 1h9v9"/></defs><g stroke="none"><use href="#p"/><use href="#q"/><use href="#p" stroke="blue" x="20"/></g>',
  ),
  'use of what is hidden': page(
    '<path id="p" visibility="hidden" d="M1 1h9"/><use href="#p" x="20"/><use href="#p" visibility="visible" x="40"/><path id="n" display="none" d="M1 1h9"/><use href="#n" x="20"/><g display="none"><path id="q" d="M1 3h9"/></g><use href="#q"/>',
  ),
  'use that is hidden': page(
    `${DEFINED}<use href="#p" opacity="0"/><use href="#p" display="none"/><use href="#p" visibility="hidden"/>`,
  ),
  'use of what is never drawn': page(
    '<clipPath id="c"><path id="d" d="M1 1h9"/></clipPath><use href="#c"/><use href="#d"/><marker id="m"><path id="n" d="M1 5h9"/></marker><use href="#m"/><use href="#n"/><defs id="e"><path d="M1 9h9"/></defs><use href="#e"/>',
  ),
  'use of itself': page(
    '<use id="u" href="#u"/><g id="g"><path d="M1 1h9"/><use href="#g" x="9"/></g><use href="#root"/>',
    'id="root"',
  ),
  'use of each other': page(
    '<g id="a"><path d="M1 1h9"/><use href="#b" x="9"/></g><g id="b"><path d="M1 5h9"/><use href="#a" y="9"/></g>',
  ),
  'use of switch and of a': page(
    '<switch id="w"><path systemLanguage="xx" d="M1 1h9"/><path d="M1 3h9"/></switch><use href="#w" y="20"/><a id="l"><path d="M1 5h9"/></a><use href="#l" y="20"/>',
  ),
};

export const SYMBOLS: Cases = {
  'use of a symbol': page(
    `<symbol id="s" viewBox="0 0 70 70">${SQUIGGLE}</symbol><use href="#s" x="10" y="5" width="60" height="50"/><use href="#s" x="80" y="5" width="35" height="70"/>`,
  ),
  'use of a symbol without size': page(
    `<symbol id="s" viewBox="0 0 70 70">${SQUIGGLE}</symbol><use href="#s"/>`,
  ),
  'use of a symbol with a size of its own': page(
    '<symbol id="s" viewBox="0 0 20 20" width="60" height="40"><path d="M2 2h9v9"/></symbol><use href="#s" x="5"/><use href="#s" width="20"/><use href="#s" height="20"/>',
  ),
  'use of a symbol with a place of its own': page(
    '<symbol id="s" viewBox="0 0 20 20" x="10" y="5" width="20" height="20"><path d="M2 2h9v9"/></symbol><use href="#s" x="5"/>',
  ),
  'use of a symbol that is stretched': page(
    '<symbol id="s" viewBox="0 0 20 20" preserveAspectRatio="none"><path d="M2 2h9v9"/></symbol><use href="#s" width="80" height="30"/>',
  ),
  'use of a symbol with a transform': page(
    '<symbol id="s" viewBox="0 0 20 20" transform="rotate(10)"><path d="M2 2h9v9"/></symbol><use href="#s" width="80" height="30"/>',
  ),
  'use of a symbol without viewBox': page(
    '<symbol id="s"><path d="M2 2h9v9"/><line x2="100%" y2="50%"/></symbol><use href="#s" width="80" height="30"/><use href="#s" x="20"/>',
  ),
  'use of a symbol with a style': page(
    '<symbol id="s" stroke="red"><path d="M2 2h9v9"/></symbol><g stroke="none"><use href="#s"/><use href="#s" stroke="blue" y="20"/></g>',
  ),
  'use of a symbol with refX': page(
    '<symbol id="s" viewBox="0 0 20 20" refX="10" refY="center"><path d="M2 2h9v9"/></symbol><use href="#s" x="40" y="40" width="20" height="20"/>',
  ),
  'use of a symbol in a symbol': page(
    `<symbol id="s" viewBox="0 0 70 70">${SQUIGGLE}</symbol><symbol id="t" viewBox="0 0 10 10"><use href="#s" x="1" width="8" height="50%"/></symbol><use href="#t" x="20" y="9" width="120" height="90"/>`,
  ),
  'use of a nested svg': page(
    `<svg id="s" x="5" y="6" width="30" height="20" viewBox="0 0 70 70">${SQUIGGLE}</svg><use href="#s" x="30" y="40"/><use href="#s" x="80" y="5" width="70" height="50"/><use href="#s" y="90" height="50%"/>`,
  ),
  'nested svg': page(
    `<svg x="20" y="10" width="80" height="60" viewBox="0 0 70 70">${SQUIGGLE}</svg><svg x="100"><circle cx="50%" cy="20" r="5"/></svg>`,
  ),
  'nested svg three deep': page(
    `<svg x="20" y="10" width="80%" height="60" viewBox="0 0 70 70"><svg x="10%" y="5" width="50" height="60" viewBox="-5 -5 50 20" preserveAspectRatio="xMaxYMin slice"><svg x="1" width="50%">${SQUIGGLE}</svg></svg></svg>`,
  ),
  'nested svg of no size': page(`<svg width="0" height="10">${LINE}</svg>${LINE}`),
  'nested svg with a transform': page(
    `<svg x="20" y="10" width="80" height="60" viewBox="0 0 70 70" transform="rotate(10)">${SQUIGGLE}</svg>`,
  ),
};

export const CONDITIONS: Cases = {
  switch: page(
    '<switch><path requiredExtensions="http://example.org/x" d="M1 1h9"/><g systemLanguage="xx"><path d="M1 3h9"/></g><g><path d="M1 5h9"/><path d="M1 6h9"/></g><path d="M1 7h9"/></switch>',
  ),
  'switch with a foreignObject first': page(
    '<switch><foreignObject requiredExtensions="http://example.org/x" width="9" height="9"/><g><path d="M1 3h9"/></g></switch>',
  ),
  'switch without a match': page('<switch><path systemLanguage="xx" d="M1 1h9"/></switch>'),
  'switch in switch': page(
    '<switch><switch systemLanguage="en"><path systemLanguage="de" d="M1 1h9"/><path d="M1 5h9"/></switch><path d="M1 3h9"/></switch>',
  ),
  'switch whose first child is hidden': page(
    '<switch><path display="none" d="M1 1h9"/><path d="M1 3h9"/></switch>',
  ),
  'switch whose first child draws nothing': page(
    '<switch><title>x</title><path d="M1 3h9"/></switch><switch><defs/><path d="M1 5h9"/></switch><switch><nothing/><path d="M1 7h9"/></switch>',
  ),
  'switch by language': page(
    '<switch><path systemLanguage="de, en-US" d="M1 1h9"/><path d="M1 3h9"/></switch><path systemLanguage="en-GB" d="M1 5h9"/><path systemLanguage="EN" d="M1 7h9"/><path systemLanguage="english" d="M1 9h9"/>',
  ),
  'conditions outside switch': page(
    '<path requiredExtensions="" d="M1 1h9"/><path requiredExtensions="http://example.org/x" d="M1 3h9"/><path systemLanguage="" d="M1 5h9"/><path requiredFeatures="http://example.org/y" d="M1 7h9"/>',
  ),
  'conditions on what holds others': page(
    '<path id="p" d="M1 1h9"/><use systemLanguage="xx" href="#p" x="20"/><svg systemLanguage="xx"><path d="M1 3h9"/></svg><a systemLanguage="xx"><path d="M1 5h9"/></a><defs><path id="q" systemLanguage="xx" d="M1 7h9"/></defs><use href="#q"/>',
  ),
};

export const GROUPS: Cases = {
  'links and groups': page('<a href="#x"><path d="M1 1h9"/></a><g><a><g><path d="M1 3h9"/></g></a></g>'),
  'what is never drawn': page(
    '<defs><path d="M1 1h9"/></defs><symbol><path d="M1 3h9"/></symbol><clipPath id="c"><path d="M1 5h9"/></clipPath><mask id="m"><path d="M1 7h9"/></mask><pattern id="n"><path d="M1 9h9"/></pattern><marker id="k"><path d="M1 11h9"/></marker><path d="M1 13h9"/>',
  ),
  'elements of no language': page(
    '<unknown><path d="M1 1h9"/></unknown><g><path d="M1 3h9"/></g><x:path xmlns:x="http://example.org/" d="M1 5h9"/>',
  ),
  'shapes in shapes': page(
    '<path d="M1 1h9"><path d="M1 3h9"/></path><rect width="9" height="9"><line x2="9" y2="9"/></rect>',
  ),
  'layers of an editor, one hidden': page(
    '<g xmlns:e="http://example.org/editor" e:mode="layer" e:label="Cut" id="layer1"><path d="M1 1h9"/></g><g id="layer2" style="display:none"><path d="M1 3h9"/></g><g id="layer3" visibility="hidden"><path d="M1 5h9"/><path d="M1 7h9" visibility="visible"/></g>',
  ),
  'hidden by opacity': page(
    '<g opacity="0"><path d="M1 1h9"/></g><path d="M1 3h9" opacity="0"/><path d="M1 5h9" opacity=".1"/><path d="M1 7h9" opacity="0%"/><g opacity="-1"><path d="M1 9h9"/></g><g style="opacity:0"><path d="M1 11h9" opacity="1"/></g>',
  ),
  'animations at their start': page(
    '<path d="M1 1h9"><animate attributeName="d" to="M1 1h90" begin="9s" dur="2s"/></path><path d="M1 5h9"><set attributeName="display" to="none" begin="9s"/></path>',
  ),
  'text, images and foreign content beside lines': page(
    '<text x="9" y="9" stroke="none">a</text><image width="9" height="9"/><foreignObject width="9" height="9"/><path d="M1 1h9"/>',
  ),
};
