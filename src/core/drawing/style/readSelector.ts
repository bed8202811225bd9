/// <reference path="../vendor.d.ts" />
import parse, { type SelectorNode } from 'css-tree/selector-parser';
import { splitOutside, unescaped } from './cssText.js';
import { readPlainSelector } from './plainSelector.js';
import { ALWAYS, isPseudoElement, NEVER } from './pseudoClasses.js';
import {
  type AttributeTest,
  CLASS_WEIGHT,
  type Combinator,
  highestSpecificity,
  ID_WEIGHT,
  type Selector,
  type Test,
  TYPE_WEIGHT,
} from './selector.js';
import {
  childrenOf,
  combinatorOf,
  mentionsNesting,
  NotRead,
  NTH_SHORT,
  selectorsIn,
  textIn,
} from './selectorNodes.js';

const SVG_NAMESPACE = 'http://www.w3.org/2000/svg';
const XLINK_NAMESPACE = 'http://www.w3.org/1999/xlink';
const XML_NAMESPACE = 'http://www.w3.org/XML/1998/namespace';

/** Longer ones are not read: real ones have up to some hundred characters. */
const LONGEST = 2000;
/** Compounds of one selector, as many as real ones have many times over. */
const MOST_COMPOUNDS = 32;

/** What a selector's names depend on. */
export interface SelectorScope {
  /** Declared by `@namespace`; '' is the default. */
  readonly namespaces: ReadonlyMap<string, string>;
  /** The selectors of the rule around this one, which `&` stands for; null outside rules. */
  readonly nesting: readonly Selector[] | null;
}

/** A list of selectors, all or none (Selectors Level 4, §3.9 "Invalid selectors"); null where one is not read. */
export function readSelectorList(text: string, scope: SelectorScope): Selector[] | null {
  const list: Selector[] = [];
  for (const part of splitOutside(text, ',')) {
    const selector = readSelector(part, scope);
    if (!selector) return null;
    list.push(selector);
  }
  return list;
}

/** One selector of Selectors Level 4, read with css-tree; null where it is wrong or not read here. */
export function readSelector(text: string, scope: SelectorScope): Selector | null {
  if (text.length > LONGEST) return null;
  const plain = scope.nesting === null && !scope.namespaces.has('') ? readPlainSelector(text.trim()) : null;
  if (plain) return plain;
  try {
    return new SelectorReader(scope).complex(parse(text, { context: 'selector' }), scope.nesting !== null);
  } catch {
    // The parser throws for what is no selector, as does what is not read here.
    return null;
  }
}

class SelectorReader {
  constructor(private readonly scope: SelectorScope) {}

  /** `relative`: it is one in the block of a rule, so that without `&` it begins at that rule's element. */
  complex(node: SelectorNode, relative: boolean): Selector {
    const nodes = childrenOf(node);
    const leading = nodes[0]?.type === 'Combinator';
    const hasNesting = relative && mentionsNesting(node);
    const compounds: Test[][] = [[]];
    const combinators: Combinator[] = [];
    let specificity = 0;
    if (relative && (leading || !hasNesting)) {
      specificity += this.nest(compounds[0]);
      if (!leading) {
        combinators.push(' ');
        compounds.push([]);
      }
    }
    for (const part of nodes) {
      if (part.type === 'Combinator') {
        if (compounds[compounds.length - 1].length === 0) throw new NotRead();
        combinators.push(combinatorOf(part));
        if (compounds.push([]) > MOST_COMPOUNDS) throw new NotRead();
      } else specificity += this.simple(part, compounds[compounds.length - 1]);
    }
    if (compounds[compounds.length - 1].length === 0) throw new NotRead();
    return { compounds: compounds.reverse(), combinators: combinators.reverse(), specificity };
  }

  private nest(tests: Test[]): number {
    const { nesting } = this.scope;
    if (nesting === null) {
      tests.push({ kind: 'root' }); // Outside rules `&` is `:scope` (CSS Nesting Module Level 1).
      return 0;
    }
    tests.push({ kind: 'is', negated: false, list: nesting });
    return highestSpecificity(nesting);
  }

  /** Adds the tests of one simple selector and returns its specificity. */
  private simple(node: SelectorNode, tests: Test[]): number {
    switch (node.type) {
      case 'TypeSelector':
        return this.type(String(node.name), tests);
      case 'IdSelector':
        if (/^\d|^-\d/.test(String(node.name))) throw new NotRead();
        tests.push({ kind: 'id', id: unescaped(String(node.name)) });
        return ID_WEIGHT;
      case 'ClassSelector':
        tests.push({ kind: 'class', name: unescaped(String(node.name)) });
        return CLASS_WEIGHT;
      case 'AttributeSelector':
        tests.push(this.attribute(node));
        return CLASS_WEIGHT;
      case 'NestingSelector':
        return this.nest(tests);
      case 'PseudoElementSelector':
        if (!isPseudoElement(String(node.name))) throw new NotRead();
        tests.push({ kind: 'never' });
        return TYPE_WEIGHT;
      case 'PseudoClassSelector':
        return this.pseudoClass(String(node.name).toLowerCase(), node, tests);
      default:
        throw new NotRead();
    }
  }

  private type(text: string, tests: Test[]): number {
    const bar = text.indexOf('|');
    const prefix = bar < 0 ? null : unescaped(text.slice(0, bar));
    const name = unescaped(text.slice(bar + 1));
    const uri = prefix === null ? this.scope.namespaces.get('') : this.uriOf(prefix);
    if (uri !== undefined && uri !== '*') tests.push({ kind: 'namespace', isSvg: uri === SVG_NAMESPACE });
    tests.push(name === '*' ? { kind: 'always' } : { kind: 'type', name });
    return name === '*' ? 0 : TYPE_WEIGHT;
  }

  private uriOf(prefix: string): string {
    if (prefix === '*' || prefix === '') return prefix;
    const uri = this.scope.namespaces.get(prefix);
    if (uri === undefined) throw new NotRead();
    return uri;
  }

  private attribute(node: SelectorNode): AttributeTest {
    const written = String((node.name as SelectorNode).name);
    const bar = written.indexOf('|');
    const local = unescaped(written.slice(bar + 1));
    const uri = bar < 0 ? '' : this.uriOf(unescaped(written.slice(0, bar)));
    const prefixes: ReadonlyMap<string, string> = new Map([
      ['*', ''],
      ['', ''],
      [XLINK_NAMESPACE, 'xlink:'],
      [XML_NAMESPACE, 'xml:'],
    ]);
    const prefix = prefixes.get(uri);
    const flags = node.flags?.toLowerCase() ?? '';
    if (prefix === undefined || !['', 'i'].includes(flags)) throw new NotRead();
    const { value } = node;
    return {
      kind: 'attribute',
      name: prefix + local,
      anyPrefix: uri === '*',
      operator: (node.matcher ?? '') as AttributeTest['operator'],
      value: textIn(value),
      ignoreCase: flags === 'i',
    };
  }

  private pseudoClass(name: string, node: SelectorNode, tests: Test[]): number {
    const [argument] = childrenOf(node);
    const hasArgument = node.children !== null;
    if (hasArgument) return this.functional(name, node, argument, tests);
    const nth = NTH_SHORT.get(name);
    if (nth) tests.push(...nth);
    else if (name === 'root' || name === 'scope') tests.push({ kind: 'root' });
    else if (name === 'empty') tests.push({ kind: 'empty' });
    else if (['link', 'any-link', '-webkit-any-link'].includes(name)) tests.push({ kind: 'link' });
    else if (ALWAYS.has(name)) tests.push({ kind: 'always' });
    else if (NEVER.has(name)) tests.push({ kind: 'never' });
    else if (['before', 'after', 'first-line', 'first-letter'].includes(name)) {
      tests.push({ kind: 'never' });
      return TYPE_WEIGHT;
    } else throw new NotRead();
    return CLASS_WEIGHT;
  }

  private functional(
    name: string,
    node: SelectorNode,
    argument: SelectorNode | undefined,
    tests: Test[],
  ): number {
    switch (name) {
      case 'is':
      case 'where':
      case '-webkit-any': {
        const list = this.forgiving(argument);
        tests.push({ kind: 'is', negated: false, list });
        return name === 'where' ? 0 : highestSpecificity(list);
      }
      case 'not': {
        const list = this.list(argument);
        tests.push({ kind: 'is', negated: true, list });
        return highestSpecificity(list);
      }
      case 'has':
        return this.has(argument, tests);
      case 'lang': {
        // Browsers take names here, not strings.
        const words = childrenOf(node).filter(({ type }) => type !== 'Operator');
        if (words.length === 0 || words.some(({ type }) => type !== 'Identifier')) throw new NotRead();
        tests.push({ kind: 'lang', ranges: words.map((word) => textIn(word).toLowerCase()) });
        return CLASS_WEIGHT;
      }
      case 'dir':
        // Drawings have no direction of their own, so that it is left to right.
        tests.push({ kind: String(argument?.name).toLowerCase() === 'ltr' ? 'always' : 'never' });
        return CLASS_WEIGHT;
      case 'host':
      case 'host-context':
        tests.push({ kind: 'never' });
        return CLASS_WEIGHT;
      default:
        return this.nth(name, argument, tests);
    }
  }

  private nth(name: string, argument: SelectorNode | undefined, tests: Test[]): number {
    const match = /^nth-(last-)?(child|of-type)$/.exec(name);
    if (!match || argument?.type !== 'Nth') throw new NotRead();
    const { nth, selector } = argument;
    let [a, b] = [Number(nth.a ?? 0), Number(nth.b ?? 0)];
    if (nth.type === 'Identifier') {
      const word = String(nth.name).toLowerCase();
      if (word !== 'odd' && word !== 'even') throw new NotRead();
      [a, b] = [2, word === 'odd' ? 1 : 0];
    }
    if (!Number.isInteger(a) || !Number.isInteger(b)) throw new NotRead();
    const ofType = match[2] === 'of-type';
    if (selector !== null && ofType) throw new NotRead();
    const of = selector === null ? null : this.list(selector);
    tests.push({ kind: 'nth', a, b, fromEnd: match[1] !== undefined, ofType, of });
    return CLASS_WEIGHT + (of ? highestSpecificity(of) : 0);
  }

  private has(argument: SelectorNode | undefined, tests: Test[]): number {
    const list: Selector[] = [];
    let besides = false;
    for (const node of selectorsIn(argument)) {
      const nodes = childrenOf(node);
      const leading: Combinator = nodes[0]?.type === 'Combinator' ? combinatorOf(nodes[0]) : ' ';
      const rest = nodes[0]?.type === 'Combinator' ? nodes.slice(1) : nodes;
      const inner = this.complex({ ...node, children: { toArray: () => rest } }, false);
      besides ||= leading === '+' || leading === '~';
      list.push({
        compounds: [...inner.compounds, [{ kind: 'anchor' }]],
        combinators: [...inner.combinators, leading],
        specificity: inner.specificity,
      });
    }
    if (list.length === 0) throw new NotRead();
    tests.push({ kind: 'has', list, besides });
    return highestSpecificity(list);
  }

  private list(argument: SelectorNode | undefined): Selector[] {
    const list = selectorsIn(argument).map((node) => this.complex(node, false));
    if (list.length === 0) throw new NotRead();
    return list;
  }

  /** Those that are read: the others are as if they were not there (Selectors Level 4, §18.1). */
  private forgiving(argument: SelectorNode | undefined): Selector[] {
    return selectorsIn(argument).flatMap((node) => {
      try {
        return [this.complex(node, false)];
      } catch {
        return [];
      }
    });
  }
}
