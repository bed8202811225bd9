const PIECES = [
  ...[
    '<',
    '>',
    '/',
    '"',
    "'",
    '=',
    '&',
    ';',
    '!',
    '?',
    '-',
    ':',
    ' ',
    '\n',
    '\r\n',
    '\t',
    '[',
    ']',
    '%',
    '#',
  ],
  ...[
    'a',
    '0',
    '.',
    '_',
    '\u00e9',
    '\u00b7',
    '\u00a0',
    '\u2028',
    '\0',
    '\u0001',
    '\ufffe',
    '\ud800',
    '\u{1F600}',
  ],
  ...['<g>', '</g>', '<g/>', '<g ', '/>', '<!--', '-->', '--', '<![CDATA[', ']]>', '<?x y?>', '<?x?>', '?>'],
  ...['&amp;', '&lt;', '&#65;', '&#x41;', '&#0;', '&#xd800;', '&no;', '&red;', '&ns;', '&', '&;', '&#;'],
  ...[
    ' xmlns="urn:q"',
    ' xmlns:q="urn:q"',
    ' q:z="1"',
    ' xmlns:q=""',
    ' a="1"',
    ' a="1" a="2"',
    'q:',
    ' id=x',
  ],
  ...[
    '<?xml version="1.0"?>',
    '<!DOCTYPE svg>',
    '<!DOCTYPE svg [',
    ']>',
    '<!ENTITY e "f">',
    '<svg/>',
    '__proto__',
  ],
];

/** A text with one to three changes: parts taken out, put in, doubled, moved, cut off. */
export function randomChanges(text: string, random: () => number): string {
  const below = (n: number): number => Math.floor(random() * n);
  let changed = text;
  for (let left = 1 + below(3); left > 0; left--) {
    const at = below(changed.length + 1);
    const length = 1 + below(random() < 0.7 ? 3 : 60);
    const head = changed.slice(0, at);
    const part = changed.slice(at, at + length);
    const tail = changed.slice(at + length);
    const kind = below(16);
    if (kind < 5) changed = head + tail;
    else if (kind < 11) changed = head + PIECES[below(PIECES.length)] + changed.slice(at);
    else if (kind < 13) changed = head + part + part + tail;
    else if (kind < 15) {
      const rest = head + tail;
      const to = below(rest.length + 1);
      changed = rest.slice(0, to) + part + rest.slice(to);
    } else changed = head;
  }
  return changed;
}
