export const SVG_NAMESPACE = 'http://www.w3.org/2000/svg';

/** Prefixes that Namespaces in XML 1.0 keeps for itself. */
export function isReserved(prefix: string): boolean {
  return prefix === 'xml' || prefix === 'xmlns';
}

/** Namespace declarations in force, innermost first; `''` is the default one. */
export class Scope {
  /** Whether elements without a prefix are SVG here, and whether that is said or only taken so. */
  readonly plainIsSvg: boolean;
  readonly hasDefault: boolean;

  constructor(
    private readonly prefix: string | null,
    private readonly uri: string,
    private readonly outer: Scope | null,
  ) {
    const uriOfPlain = this.lookUp('');
    this.hasDefault = uriOfPlain !== null;
    // Without any namespace an element counts as SVG, unlike in a browser: such drawings are common.
    this.plainIsSvg = uriOfPlain === null || uriOfPlain === SVG_NAMESPACE;
  }

  /** The namespace of a prefix; null where it has none, or an empty one. */
  lookUp(prefix: string): string | null {
    for (let scope: Scope | null = this; scope !== null; scope = scope.outer) {
      if (scope.prefix === prefix) return scope.uri === '' ? null : scope.uri;
    }
    return null;
  }

  /** Whether an element with this prefix is SVG: `svg:` also where nobody has declared it. */
  isSvg(prefix: string): boolean {
    if (prefix === '') return this.plainIsSvg;
    const uri = this.lookUp(prefix);
    return uri === SVG_NAMESPACE || (prefix === 'svg' && uri === null);
  }
}
