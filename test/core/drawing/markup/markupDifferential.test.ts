import { SaxesParser } from 'saxes';
import { describe, expect, test } from 'vitest';
import { FindingLog, Unreadable } from '../../../../src/core/drawing/findingLog.ts';
import { LineIndex } from '../../../../src/core/drawing/markup/lineIndex.ts';
import { readTree, type SvgElement, type SvgTree } from '../../../../src/core/drawing/markup/svgTree.ts';
import { DEFAULT_LIMITS } from '../../../../src/core/drawing/readingLimits.ts';
import { createRandom } from '../../../../src/core/structures/random.ts';
import { randomChanges } from '../../../support/textChanges.ts';

/** Tags, attributes and texts in document order, white space aside: what both readers are asked for. */
type Events = string[];

interface Verdict {
  readonly events: Events;
  /** Why it is refused, or read with a word about it. */
  readonly refused: string | null;
  readonly said: readonly string[];
}

function byUs(text: string): Verdict {
  const log = new FindingLog();
  const said = () => log.list().map((finding) => finding.code);
  try {
    const tree = readTree(text, new LineIndex(text), log, DEFAULT_LIMITS);
    return { events: eventsOf(tree), refused: null, said: said() };
  } catch (error) {
    if (!(error instanceof Unreadable)) throw error;
    return { events: [], refused: error.code, said: said() };
  }
}

function eventsOf({ root, attributes }: SvgTree): Events {
  const events: Events = [];
  const pending: (SvgElement | string | null)[] = [root];
  while (pending.length > 0) {
    const node = pending.pop();
    if (node === null || node === undefined) events.push('/');
    else if (typeof node === 'string') addText(events, node);
    else {
      const list: string[] = [];
      for (let i = attributes.begin(node.number); i < attributes.end(node.number); i++) {
        list.push(attributeEvent(attributes.nameAt(i), attributes.valueAt(i)));
      }
      events.push(`<${node.name} ${list.sort().join(' ')}`);
      pending.push(null, ...[...node.children].reverse());
    }
  }
  return events;
}

/** An independent XML parser; it knows the entities of the document type that are plain text. */
function byOther(text: string): Verdict {
  const parser = new SaxesParser({ xmlns: true });
  const events: Events = [];
  const said: string[] = [];
  parser.on('error', (error) => {
    said.push(error.message);
  });
  parser.on('doctype', (doctype) => {
    for (const [, name, value] of doctype.matchAll(/<!ENTITY\s+(\w+)\s+"([^"<&]*)"/g)) {
      parser.ENTITIES[name] ??= value;
    }
  });
  parser.on('opentag', (tag) => {
    const list = Object.values(tag.attributes).map(({ name, value }) => attributeEvent(name, value));
    events.push(`<${tag.local} ${list.sort().join(' ')}`);
  });
  parser.on('closetag', () => {
    events.push('/');
  });
  parser.on('text', (piece) => {
    addText(events, piece);
  });
  parser.on('cdata', (piece) => {
    addText(events, piece);
  });
  parser.write(text).close();
  return { events, refused: said[0] ?? null, said };
}

function attributeEvent(name: string, value: string): string {
  // XML 1.0 §2.11, §3.3.3: white space in values comes out as spaces.
  return `${name}="${value.replace(/\r\n?|[\n\t]/g, ' ')}"`;
}

function addText(events: Events, piece: string): void {
  const text = piece.replace(/\s+/g, '');
  const last = events.length - 1;
  if (text === '') return;
  if (events[last]?.startsWith('"')) events[last] += text;
  else events.push(`"${text}`);
}

/** What we read though it is no XML, each by a finding of its own. */
const LENIENT = ['unknown-entity', 'external-entity', 'undeclared-prefix', 'xml-not-strict'];
/** What we refuse though it is XML, or what the other reader does not look at. */
const STRICTER = ['not-svg', 'xml-bad-doctype', 'entity-limit', 'entity-loop', 'past-limit'];

/** Namespaces in XML 1.0: what follows the colon begins as a name does. The other reader does not look. */
const BAD_LOCAL_NAME = /:[-.0-9\u00b7]/;
/** Half a pair is no character of XML. The other reader does not look. */
const LONE_SURROGATE = /[\ud800-\udfff]/u;
/** The target of a processing instruction ends at white space or `?>`; the other reader lets it go on. */
const BAD_TARGET = /<\?[^\s?]*\?(?!>)/;
/** Entities made of others, which the other reader cannot be told. */
const ENTITY_OF_ENTITIES = /<!ENTITY\s[^>]*[&<][^>]*>/;

function expectAgreement(text: string): void {
  if (ENTITY_OF_ENTITIES.test(text)) return;
  const ours = byUs(text);
  const other = byOther(text);
  const disagreement = `${JSON.stringify(text)}\nwe: ${ours.refused} ${ours.said}, the other: ${other.refused}`;
  if (ours.refused !== null) {
    const stricter =
      STRICTER.includes(ours.refused) ||
      [BAD_LOCAL_NAME, LONE_SURROGATE, BAD_TARGET].some((form) => form.test(text));
    if (other.refused === null && !stricter) expect.fail(disagreement);
  } else if (other.refused !== null) {
    if (!ours.said.some((code) => LENIENT.includes(code))) expect.fail(disagreement);
  } else expect(ours.events, disagreement).toEqual(other.events);
}

const DRAWINGS: Readonly<Record<string, string>> = {
  'from a vector editor': `<?xml version="1.0" encoding="UTF-8" standalone="no"?>
<!-- Made by hand -->
<svg width="210mm" height="297mm" viewBox="0 0 210 297" version="1.1" id="svg5"
   xmlns:ed="urn:example:editor" xmlns:xlink="http://www.w3.org/1999/xlink" xmlns="http://www.w3.org/2000/svg">
  <ed:view id="view7" pagecolor="#ffffff" ed:zoom="0.7"><ed:grid/></ed:view>
  <defs id="defs2"><g id="leaf"><path d="m 1,2 c 3,4 5,6 7,8 z" /></g></defs>
  <g ed:label="Layer 1" ed:mode="layer" id="layer1">
    <path style="fill:none;stroke:#000000;stroke-width:.26" d="m 30,40 10,0 c 5,5 5,5 0,10 z" id="p1"/>
    <use xlink:href="#leaf" x="5"/><text x="1" y="2">Fish &amp; chips<tspan dy='1'>, 5 &lt; 6</tspan></text>
  </g>
</svg>`,
  'with a document type': `<?xml version='1.0'?>
<!DOCTYPE svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd" [
  <!ENTITY ns "http://www.w3.org/2000/svg">
  <!ENTITY red "stroke:#f00">
  <!-- a ] and a > -->
  <!ELEMENT g ANY>
]>
<?xml-stylesheet href="a.css" type="text/css"?>
<svg xmlns="&ns;" viewBox="0 0 9 9"><title>Caf\u00e9 \u{1F600} &#233;&#x1F600;</title>
<g style="&red;;fill:none"><path d="M0 0L9 9"/><desc>x &red; y</desc></g></svg>
<!-- end -->`,
  'with a style sheet and prefixes': `<s:svg xmlns:s="http://www.w3.org/2000/svg" xmlns:b="urn:b" xmlns:c="urn:b" width="9">
<s:style><![CDATA[ .a > .b { stroke: red } /* <g> & ]] */ ]]></s:style><b:meta b:x="1" x="2"/>
<s:g class="a"><s:g xmlns="urn:d" c:y="3"><rect/></s:g><s:path class="b" d="M1 1h1"/><!-- - --></s:g>
<?pi data?><![CDATA[]]>
</s:svg>
`,
};

describe('the guard with svg-parser, and an independent XML parser', () => {
  test.each(Object.keys(DRAWINGS))('agree on a drawing %s', (name) => {
    expect(byOther(DRAWINGS[name]).said).toEqual([]);
    expect(byUs(DRAWINGS[name]).refused).toBeNull();
    expectAgreement(DRAWINGS[name]);
  });

  test.each(Object.keys(DRAWINGS))('agree on 700 changes of a drawing %s', (name) => {
    const random = createRandom(20261201);
    for (let i = 0; i < 700; i++) expectAgreement(randomChanges(DRAWINGS[name], random));
  });
});
