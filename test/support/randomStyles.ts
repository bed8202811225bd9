import { createRandom, randomBelow } from '../../src/core/structures/random.ts';

/**
 * Small drawings with random trees, classes and style sheets, the same for each seed. Those with copies hold
 * only style that changes the boxes of shapes, since a page can be asked for no more of what is in a copy.
 */
export function randomStyledDrawing(seed: number, withCopies: boolean): string {
  return new Maker(createRandom(seed), withCopies).drawing();
}

class Maker {
  private count = 0;

  constructor(
    private readonly random: () => number,
    private readonly withCopies: boolean,
  ) {}

  drawing(): string {
    const rules = this.some(3, 9, () => this.rule(0)).join('\n');
    const sheet = `<style>${rules.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;')}</style>`;
    const tree = this.some(2, 4, () => this.element(0)).join('');
    // How a root is sized, moved or hidden by style is for other tests: it would spoil all that is in it here.
    const fixed = [
      'display:inline',
      'width:800px',
      'height:600px',
      'transform:none',
      'translate:none',
      'scale:none',
    ]
      .map((declaration) => `${declaration}!important`)
      .join(';');
    const root = `xmlns="http://www.w3.org/2000/svg" width="800" height="600" fill="none" stroke="black" style="${fixed}"`;
    if (!this.withCopies) return `<svg ${root}>${sheet}${tree}</svg>`;
    const copied = this.group(0, 'id="t"');
    const attributes = () => (this.is(0.3) ? `class="${this.name()}"` : '');
    const copy = `<use id="u" href="#t" x="7" ${attributes()}/>`;
    return `<svg ${root}>${sheet}<defs>${this.element(2)}${copied}</defs>${tree}<g ${attributes()}>${copy}</g></svg>`;
  }

  private element(depth: number): string {
    return depth < 4 && this.is(0.4) ? this.group(depth, '') : this.shape();
  }

  private group(depth: number, attributes: string): string {
    const inner = this.some(1, 4, () => this.element(depth + 1)).join('');
    return `<g ${attributes} ${this.attributes()}>${inner}</g>`;
  }

  private shape(): string {
    const id = `s${this.count++}`;
    const at = () => 20 + this.below(40);
    return this.is(0.5)
      ? `<circle id="${id}" cx="${at()}" cy="${at()}" r="${2 + this.below(9)}" ${this.attributes()}/>`
      : `<rect id="${id}" x="${at()}" y="${at()}" width="${3 + this.below(9)}" height="5" ${this.attributes()}/>`;
  }

  private attributes(): string {
    const list: string[] = [];
    if (this.is(0.7)) list.push(`class="${[...new Set(this.some(1, 2, () => this.name()))].join(' ')}"`);
    if (this.is(0.3)) list.push(`data-x="${this.pick(['m', 'n', 'm n', 'm-n', ''])}"`);
    if (this.is(0.25)) list.push(`style="${this.declarations()}"`);
    if (this.is(0.2))
      list.push(this.pick(['transform="translate(7 3)"', 'display="inline"', 'opacity="0.5"']));
    if (!this.withCopies && this.is(0.2)) {
      list.push(this.pick(['stroke="green"', 'stroke="none"', 'stroke="inherit"', 'visibility="hidden"']));
    }
    return list.join(' ');
  }

  private rule(depth: number): string {
    const selectors = this.some(1, 2, () => this.complex(depth > 0)).join(',');
    const nested = depth < 2 && this.is(0.15) ? `;${this.rule(depth + 1)}${this.declarations()}` : '';
    const rule = `${selectors}{${this.declarations()}${nested}}`;
    if (depth > 0 || this.is(0.75)) return rule;
    // In copies Chromium takes layers for no layers.
    if (this.withCopies) return this.pick([`@media screen{${rule}}`, `@media print{${rule}}`]);
    return this.pick([
      `@layer ${this.name()}{${rule}}`,
      `@media screen{${rule}}`,
      `@media print{${rule}}`,
      `@supports (x:1px){${rule}}`,
      `@layer c,${this.name()};${rule}`,
    ]);
  }

  private complex(nested: boolean): string {
    let text = this.compound();
    for (let i = this.pick([0, 0, 1, 1, 2]); i > 0; i--) {
      text += this.pick([' ', ' ', '>', '+', '~']) + this.compound();
    }
    if (!nested) return text;
    return this.pick([text, `>${text}`, `&${text.replace(/^[a-z*]+/, '') || '.a'}`, `.b &`]);
  }

  private compound(): string {
    const type = this.pick(['', '', 'g', 'rect', 'circle', '*', 'svg']);
    const rest = this.some(type === '' ? 1 : 0, 2, () => this.simple()).join('');
    return type + rest;
  }

  private simple(): string {
    const name = `.${this.name()}`;
    return this.pick([
      ...[
        name,
        name,
        name,
        name,
        `#s${this.below(6)}`,
        '[data-x]',
        '[data-x~=m]',
        '[data-x|=m]',
        '[data-x^=m]',
      ],
      ...[':first-child', ':last-child', ':only-child', ':nth-child(2n)', ':nth-last-child(-n+2)'],
      ...[
        ':nth-of-type(2)',
        ':first-of-type',
        `:nth-child(1 of ${name})`,
        `:not(${name})`,
        `:not(g>${name})`,
      ],
      ...[
        `:is(${name},#s1)`,
        `:where(${name} *)`,
        ':root',
        ':empty',
        ':hover',
        `:has(>${name})`,
        `:has(+${name})`,
      ],
      `:is(g ${name}, rect)`,
    ]);
  }

  private declarations(): string {
    return this.some(1, 3, () => this.declaration()).join(';');
  }

  private declaration(): string {
    const size = `${3 + this.below(12)}px`;
    const boxes = [
      ...[`r:${size}`, `width:${size}`, `height:calc(${size} + 1px)`, `cx:${size}`, `x:${size}`, 'r:nope'],
      ...[
        `transform:translate(${size},2px)`,
        'transform:scale(1.5)',
        `translate:${size}`,
        'transform:inherit',
      ],
      ...[
        'display:none',
        'display:inline',
        'transform:none',
        `--w:${size}`,
        'r:var(--w)',
        'width:var(--w,4px)',
      ],
      ...['r:inherit', 'x:initial', 'height:unset', 'scale:2', 'y:revert', 'r:revert-layer', 'cy:12%'],
    ];
    const paints = [
      ...[
        'stroke:red',
        'stroke:blue',
        'stroke:none',
        'stroke:var(--c)',
        'stroke:inherit',
        'stroke:currentColor',
      ],
      ...[
        'stroke:nope',
        'color:teal',
        'color:inherit',
        '--c:lime',
        '--c:var(--w)',
        'stroke:initial',
        'stroke:unset',
      ],
      ...[
        'visibility:hidden',
        'visibility:visible',
        'opacity:0',
        'opacity:.5',
        'opacity:inherit',
        'all:unset',
      ],
      ...['stroke-width:0', 'stroke-width:2', 'stroke-width:nope', 'stroke:revert', 'stroke:revert-layer'],
    ];
    const declaration = this.pick(this.withCopies || this.is(0.4) ? boxes : paints);
    const important = this.is(0.1) && !declaration.includes('revert-layer');
    return important ? `${declaration}!important` : declaration;
  }

  private name(): string {
    return this.pick(['a', 'b', 'c', 'd']);
  }

  private some<T>(least: number, most: number, make: () => T): T[] {
    return Array.from({ length: least + this.below(most - least + 1) }, make);
  }

  private is(chance: number): boolean {
    return this.random() < chance;
  }

  private below(bound: number): number {
    return randomBelow(this.random, bound);
  }

  private pick<T>(list: readonly T[]): T {
    return list[this.below(list.length)];
  }
}
