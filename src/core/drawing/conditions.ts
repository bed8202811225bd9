import type { SvgElement } from './svgTree.js';

type Specified = ReadonlyMap<string, string>;

/**
 * Whether an element's conditional processing attributes hold (SVG 2, "Conditional processing"): no
 * extension is known here, and the language is taken to be English. `requiredFeatures` always holds.
 */
export function holds(specified: Specified): boolean {
  if (specified.has('requiredExtensions')) return false;
  const languages = specified.get('systemLanguage');
  return languages === undefined || /(?:^|,)\s*en(?:-[\w-]*)?\s*(?:,|$)/i.test(languages);
}

/**
 * The child that a `switch` draws: the first whose conditions hold. A foreignObject is passed over
 * even where its conditions hold, since its content is never drawn and what follows stands in for it.
 */
export function firstThatHolds(
  element: SvgElement,
  specifiedOn: (child: SvgElement) => Specified,
): { readonly chosen: SvgElement | null; readonly passedOver: readonly SvgElement[] } {
  const passedOver: SvgElement[] = [];
  for (const child of element.children) {
    if (typeof child === 'string' || !child.isSvg) continue;
    if (!holds(specifiedOn(child))) continue;
    if (child.name !== 'foreignObject') return { chosen: child, passedOver };
    passedOver.push(child);
  }
  return { chosen: null, passedOver };
}
