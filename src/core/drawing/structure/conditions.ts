import type { SvgElement } from '../markup/svgTree.js';

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

/** Which child of a `switch` is drawn. */
export interface Choice {
  readonly chosen: SvgElement | null;
  /** Each a foreignObject whose conditions hold. */
  readonly passedOver: readonly SvgElement[];
  /** The first languages that were asked for; null where the choice does not depend on any. */
  readonly languages: string | null;
}

/**
 * The child that a `switch` draws: the first whose conditions hold. A foreignObject is passed over
 * even where its conditions hold, since its content is never drawn and what follows stands in for it.
 */
export function firstThatHolds(element: SvgElement, specifiedOn: (child: SvgElement) => Specified): Choice {
  const passedOver: SvgElement[] = [];
  let languages: string | null = null;
  for (const child of element.children) {
    if (typeof child === 'string' || !child.isSvg) continue;
    const specified = specifiedOn(child);
    languages ??= specified.get('systemLanguage') ?? null;
    if (!holds(specified)) continue;
    if (child.name !== 'foreignObject') return { chosen: child, passedOver, languages };
    passedOver.push(child);
  }
  return { chosen: null, passedOver, languages };
}
