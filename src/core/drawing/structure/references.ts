import { type SvgElement, textOf } from '../markup/svgTree.js';
import type { Context, Session } from '../session.js';

/** What an element refers to: `href`, or the older attribute of that local name under any prefix. */
export function hrefOf(session: Session, element: SvgElement): string | null {
  return (session.tree.attributeOf(element, 'href') ?? prefixed(session, element, 'href'))?.trim() ?? null;
}

/** The name people gave a layer: a `label` attribute of an editor's namespace, or its title. */
export function labelOf(session: Session, element: SvgElement): string | null {
  const label = session.tree.attributeOf(element, 'label') ?? prefixed(session, element, 'label');
  return label?.replace(/\s+/g, ' ').trim() || childText(element, 'title');
}

/** Characters of a layer's name taken from its title. */
const LONGEST_LABEL = 1000;

/** The text of the first child of that name, null where there is none or it is blank. */
export function childText(element: SvgElement, name: string, limit = LONGEST_LABEL): string | null {
  for (const child of element.children) {
    if (typeof child !== 'string' && child.isSvg && child.name === name) {
      return textOf(child, limit) || null;
    }
  }
  return null;
}

function prefixed(session: Session, element: SvgElement, name: string): string | null {
  const { attributes } = session.tree;
  for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
    if (attributes.nameAt(i).endsWith(`:${name}`)) return attributes.valueAt(i);
  }
  return null;
}

/** Whether the element is the other or stands in it, so that a copy would hold itself. */
function isInside(element: SvgElement, other: SvgElement): boolean {
  for (let e: SvgElement | null = element; e !== null; e = e.parent) if (e === other) return true;
  return false;
}

/**
 * Whether a copy of the target made there would stand in the target or in a copy of it: an ancestor of the
 * element, copies taken for what they copy (SVG 2, "The use element": shadow-including ancestors).
 */
export function isLoop(element: SvgElement, context: Context, target: SvgElement): boolean {
  if (isInside(element, target)) return true;
  for (let copy = context.copies; copy !== null; copy = copy.outer) {
    if (isInside(copy.use, target)) return true;
  }
  return false;
}
