import { type Declaration, type Misread, readDeclaration } from './declarations.js';
import { PROPERTIES } from './properties.js';
import { readSelectorList } from './readSelector.js';
import { mediaHolds, supportHolds, type Truth } from './ruleConditions.js';
import type { Selector } from './selector.js';
import { readStyleBlocks, type StyleItem } from './styleBlocks.js';

/** A layer of the cascade; the outermost has no name and holds what is in no layer. */
export interface Layer {
  readonly inner: Map<string, Layer>;
  /** Its place in the cascade, known when all sheets are read. */
  rank: number;
}

/** A rule of one selector: lists are parted. `order` counts rules through all sheets. */
export interface Rule {
  readonly selector: Selector;
  readonly declarations: readonly Declaration[];
  readonly layer: Layer;
  readonly order: number;
}

/** What reading a sheet finds, by place: characters from the start of its text. */
export interface SheetFindings {
  /** A rule or at-rule that is left out. */
  unread(rule: string, at: number): void;
  misread(what: Misread, at: number): void;
  /** Another sheet that is asked for. */
  elsewhere(sheet: string, at: number): void;
}

/** At-rules that say nothing about lines. */
const NO_STYLE: ReadonlySet<string> = new Set([
  ...['charset', 'font-face', 'keyframes', '-webkit-keyframes', '-moz-keyframes', '-o-keyframes', 'page'],
  ...['font-feature-values', 'font-palette-values', 'counter-style', 'view-transition', 'color-profile'],
  ...['starting-style', 'position-try', 'viewport', '-ms-viewport'],
]);

/** Rules whose selectors are not read, after which no more are tried: each costs more than one that is. */
const MOST_WRONG = 10_000;

/** Layers within layers in one name. */
const MOST_LEVELS = 16;

/** Where in the sheet a block stands. */
interface Scope {
  readonly layer: Layer;
  /** Selectors of the rule around; null outside rules. */
  readonly nesting: readonly Selector[] | null;
}

/** Reads style sheets into rules, one list for all of them, in the order of the cascade within a layer. */
export class SheetReader {
  readonly rules: Rule[] = [];
  private readonly top: Layer = newLayer();
  private unnamed = 0;
  private order = 0;
  private wrong = 0;
  private namespaces = new Map<string, string>();

  constructor(private readonly findings: SheetFindings) {}

  /** Adds the rules of one sheet: namespaces are its own, layers are shared with the others. */
  read(text: string): void {
    this.namespaces = new Map();
    const items = readStyleBlocks(text, (at) => this.findings.unread(text.slice(at, at + 60), at));
    this.items(items, { layer: this.top, nesting: null });
    let rank = 0;
    const visit = (layer: Layer): void => {
      for (const inner of layer.inner.values()) visit(inner);
      layer.rank = rank++;
    };
    visit(this.top);
  }

  private items(items: readonly StyleItem[], scope: Scope): void {
    let declarations: Declaration[] = [];
    const flush = (): void => {
      if (declarations.length > 0 && scope.nesting !== null)
        this.add(scope.nesting, declarations, scope.layer);
      declarations = [];
    };
    for (const item of items) {
      if (item.kind === 'declaration') {
        // Outside rules there is nothing that a declaration could be of.
        if (scope.nesting !== null) {
          declarations.push(
            ...readDeclaration(item.text, (what) => this.findings.misread(what, item.at), false),
          );
        }
        continue;
      }
      flush();
      if (item.kind === 'rule') this.rule(item.prelude, item.items ?? [], item.at, scope);
      else this.atRule(item.name, item.prelude, item.items, item.at, scope);
    }
    flush();
  }

  private add(selectors: readonly Selector[], declarations: readonly Declaration[], layer: Layer): void {
    for (const selector of selectors) {
      this.rules.push({ selector, declarations, layer, order: this.order++ });
    }
  }

  private rule(prelude: string, items: readonly StyleItem[], at: number, scope: Scope): void {
    const names = { namespaces: this.namespaces, nesting: scope.nesting };
    const selectors = this.wrong < MOST_WRONG ? readSelectorList(prelude, names) : null;
    if (selectors) this.items(items, { ...scope, nesting: selectors });
    else {
      this.wrong++;
      this.findings.unread(prelude, at);
    }
  }

  private atRule(
    name: string,
    prelude: string,
    items: readonly StyleItem[] | null,
    at: number,
    scope: Scope,
  ): void {
    const within = (truth: Truth): void => {
      if (truth === null) this.findings.unread(`@${name} ${prelude}`, at);
      else if (truth && items) this.items(items, scope);
    };
    switch (name) {
      case 'media':
        within(mediaHolds(prelude));
        break;
      case 'supports':
        within(this.supports(prelude));
        break;
      case 'layer':
        this.layer(prelude, items, scope, at);
        break;
      case 'import':
        this.findings.elsewhere(prelude, at);
        break;
      case 'namespace':
        this.namespace(prelude);
        break;
      case 'container':
        // No element of a drawing is a container, so none of these holds.
        break;
      default:
        if (!NO_STYLE.has(name)) this.findings.unread(`@${name} ${prelude}`, at);
    }
  }

  /** Browsers of today are taken to read every property that is not one of ours. */
  private supports(prelude: string): Truth {
    const declared = (name: string, value: string): Truth => {
      const property = PROPERTIES.get(name.toLowerCase());
      return property
        ? property.reads(value.replace(/\s*!important$/i, ''), false) || /\bvar\(/.test(value)
        : null;
    };
    const selects = (selector: string): Truth =>
      readSelectorList(selector, { namespaces: this.namespaces, nesting: null }) !== null;
    return supportHolds(prelude, declared, selects);
  }

  private layer(prelude: string, items: readonly StyleItem[] | null, scope: Scope, at: number): void {
    const names = prelude === '' ? [` ${this.unnamed++}`] : prelude.split(',').map((name) => name.trim());
    if (names.some((name) => name.split('.', MOST_LEVELS + 1).length > MOST_LEVELS)) {
      this.findings.unread(`@layer ${prelude.slice(0, 100)}`, at);
      return;
    }
    const layers = names.map((name) => name.split('.').reduce(layerIn, scope.layer));
    if (items && layers.length === 1) this.items(items, { ...scope, layer: layers[0] });
  }

  private namespace(prelude: string): void {
    const match = /^([\w-]*)\s*(?:url\(\s*)?["']?([^"')]*)["']?\s*\)?$/i.exec(prelude);
    if (match) this.namespaces.set(match[1], match[2]);
  }
}

function newLayer(): Layer {
  return { inner: new Map(), rank: 0 };
}

function layerIn(outer: Layer, name: string): Layer {
  let layer = outer.inner.get(name);
  if (!layer) {
    layer = newLayer();
    outer.inner.set(name, layer);
  }
  return layer;
}
