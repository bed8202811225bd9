/** Shapes of what is used of the parsing packages, which ship no types of their own for it. */

declare module 'svg-parser' {
  export interface ParsedText {
    readonly type: 'text';
    readonly value: string;
  }
  export interface ParsedElement {
    readonly type: 'element';
    readonly tagName: string;
    readonly properties: { readonly n: string };
    readonly children: readonly (ParsedElement | ParsedText)[];
  }
  export function parse(source: string): { readonly children: readonly [ParsedElement] };
}

declare module 'svg-path-parser' {
  export interface ParsedCommand {
    readonly code: string;
    readonly x?: number;
    readonly y?: number;
    readonly x1?: number;
    readonly y1?: number;
    readonly x2?: number;
    readonly y2?: number;
    readonly rx?: number;
    readonly ry?: number;
    readonly xAxisRotation?: number;
    readonly largeArc?: boolean;
    readonly sweep?: boolean;
  }
  function parsePath(data: string): ParsedCommand[];
  export default parsePath;
}

declare module 'css-tree/selector-parser' {
  export interface SelectorNode {
    readonly type: string;
    /** Text, or for an attribute selector the node of its name. */
    readonly name: string | SelectorNode;
    readonly children: { toArray(): SelectorNode[] } | null;
    readonly matcher: string | null;
    readonly value: SelectorNode | string | null;
    readonly flags: string | null;
    readonly nth: SelectorNode;
    readonly selector: SelectorNode | null;
    readonly a: string | null;
    readonly b: string | null;
  }
  function parse(text: string, options: { context: 'selector' | 'selectorList' }): SelectorNode;
  export default parse;
}
