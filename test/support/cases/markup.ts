import { type Cases, page, root } from './make.ts';

const SMALL = 'width="100" height="100"';

export const MARKUP: Cases = {
  'entities of the document': `<?xml version="1.0"?><!DOCTYPE svg [<!ENTITY st "stroke:red"><!ENTITY n "9">]>${root(SMALL, '<path style="&st;" d="M1 1h&n;"/><path stroke="none" d="M1 3h&n;"/>')}`,
  'entities in entities': `<!DOCTYPE svg [<!ENTITY a "1 1h"><!ENTITY b "M&a;9">]>${root(SMALL, '<path d="&b;"/>')}`,
  'entities with elements in them': `<!DOCTYPE svg [<!ENTITY mark '<path d="M1 1h9"/>'>]>${root(SMALL, '<g transform="translate(5 5)">&mark;</g>&mark;')}`,
  'entities for namespaces': `<!DOCTYPE svg [<!ENTITY ns "http://www.w3.org/2000/svg"><!ENTITY xl "http://www.w3.org/1999/xlink">]><svg xmlns="&ns;" xmlns:xlink="&xl;" ${SMALL} stroke="red"><path id="p" d="M1 1h9"/><use xlink:href="#p" y="9"/></svg>`,
  'defaults of attributes': `<!DOCTYPE svg [<!ATTLIST path stroke CDATA "red"><!ATTLIST g fill CDATA #IMPLIED>]><svg xmlns="http://www.w3.org/2000/svg" ${SMALL}><g><path d="M1 1h9"/><line x2="9" y2="9"/></g></svg>`,
  'a document type of the standard': `<?xml version="1.0" encoding="UTF-8" standalone="no"?>\n<!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd">\n<!-- < > & -->\n${root(SMALL, '<path d="M1 1h9"/>')}\n<!-- end -->`,
  'character references': page('<path d="M&#49;0 10&#x4c;20 30"/>'),
  'CDATA and comments in a style sheet': page(
    '<style><![CDATA[/* .a{} */.a{/*x*/stroke:none}]]></style><path class="a" d="M1 1h9"/><path d="M1 3h9"/>',
  ),
  'CDATA and instructions between elements': page(
    '<![CDATA[<path d="M1 1h9"/>]]><?note <path d="M1 2h9"/> ?><path d="M1 3h9"/>',
  ),
  'a prefix for SVG':
    '<s:svg xmlns:s="http://www.w3.org/2000/svg" width="100" height="100"><s:path stroke="red" d="M1 1h9"/><path stroke="red" d="M1 3h9"/></s:svg>',
  'prefixes that change': page(
    '<g xmlns:a="http://www.w3.org/2000/svg"><a:path d="M1 1h9"/><b:g xmlns:b="http://www.w3.org/2000/svg" xmlns="http://example.org/"><path d="M1 3h9"/><b:path d="M1 5h9"/></b:g></g>',
  ),
  'attributes of other namespaces': page(
    '<path xmlns:e="http://example.org/" e:d="M1 1h90" d="M1 1h9" e:stroke="none" e:style="stroke:none"/>',
  ),
  'attributes in capitals': page('<path D="M1 1h9"/><path d="M1 3h9" STROKE="none"/><PATH d="M1 5h9"/>'),
  'attributes over many lines': page('<path\n  d="M1 1\n h9\n\tv9"\r\n  stroke = "red"\n/>'),
};
