import { type Declaration, readDeclarations } from './declarations.js';
import type { FindingLog } from './findingLog.js';
import type { Subject } from './selector.js';
import { MOST_COMPARED, StyleSheet } from './styleSheet.js';
import { type SvgElement, type SvgTree, textOf } from './svgTree.js';

/** Distinct style attributes remembered; drawings repeat a few of them thousands of times. */
const REMEMBERED = 4096;

/**
 * What is said of one element in its attributes, in style sheets and in its style attribute, the
 * strongest of them for each name (SVG 2, "Styling": presentation attributes are the weakest).
 */
export class Cascade {
  private readonly sheet = new StyleSheet();
  private readonly specified = new Map<string, string>();
  private readonly subjects = new Map<SvgElement, Subject>();
  private saidGivenUp = false;
  private readonly remembered = new Map<string, readonly Declaration[]>();

  constructor(
    private readonly tree: SvgTree,
    private readonly log: FindingLog,
  ) {
    for (const element of tree.sheets) {
      const place = () => tree.placeOf(element);
      const type = tree.attributeOf(element, 'type') ?? '';
      if (type !== '' && type.trim().toLowerCase() !== 'text/css') {
        log.add('style-sheet-not-read', place, { type });
        continue;
      }
      const media = tree.attributeOf(element, 'media')?.trim() ?? '';
      const rules = textOf(element, Number.MAX_SAFE_INTEGER);
      this.sheet.add(media === '' ? rules : `@media ${media}{${rules}}`, (rule) =>
        log.add('style-rule-not-read', place, { rule: rule.replace(/\s+/g, ' ').slice(0, 60) }),
      );
    }
  }

  /**
   * The map is the same one each time, valid until the next call. `copied` is what a `use` copies around
   * here: selectors see ancestors up to it only (SVG 2, "The use-element shadow tree").
   */
  specifiedOn(element: SvgElement, copied: SvgElement | null = null): ReadonlyMap<string, string> {
    const { specified, tree } = this;
    const { attributes } = tree;
    specified.clear();
    for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
      const name = attributes.nameNumberAt(i);
      if (attributes.prefixes[name] === null) specified.set(attributes.names[name], attributes.valueAt(i));
    }
    const style = specified.get('style');
    if (style === undefined && this.sheet.isEmpty) return specified;
    const inline = style === undefined ? [] : this.declarationsOf(style);
    const ruled = this.sheet.isEmpty ? [] : this.ruled(element, copied);
    // The order of the cascade: rules, style attribute, important rules, important style attribute.
    for (const important of [false, true]) {
      for (const declarations of [ruled, inline]) {
        for (const d of declarations) if (d.important === important) specified.set(d.name, d.value);
      }
    }
    return specified;
  }

  private ruled(element: SvgElement, copied: SvgElement | null): readonly Declaration[] {
    const declarations = this.sheet.declarationsFor(this.subjectOf(element), () => {
      const ancestors: Subject[] = [];
      for (let e = element; e !== copied && e.parent !== null; e = e.parent)
        ancestors.push(this.subjectOf(e.parent));
      return ancestors;
    });
    if (this.sheet.gaveUp && !this.saidGivenUp) {
      this.saidGivenUp = true;
      this.log.add('style-limit', () => this.tree.placeOf(element), { limit: MOST_COMPARED });
    }
    return declarations;
  }

  private subjectOf(element: SvgElement): Subject {
    let subject = this.subjects.get(element);
    if (!subject) {
      const classes = this.tree.attributeOf(element, 'class')?.trim();
      subject = {
        name: element.name,
        id: this.tree.attributeOf(element, 'id'),
        classes: new Set(classes ? classes.split(/\s+/) : []),
      };
      this.subjects.set(element, subject);
    }
    return subject;
  }

  private declarationsOf(style: string): readonly Declaration[] {
    let declarations = this.remembered.get(style);
    if (!declarations) {
      declarations = readDeclarations(style);
      if (this.remembered.size >= REMEMBERED) this.remembered.clear();
      this.remembered.set(style, declarations);
    }
    return declarations;
  }
}
