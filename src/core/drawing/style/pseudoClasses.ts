/** States that an SVG element on paper is never in; with them a selector is valid and matches nothing. */
export const NEVER: ReadonlySet<string> = new Set([
  ...['hover', 'active', 'focus', 'focus-visible', 'focus-within', 'visited', 'target', 'host'],
  ...['checked', 'indeterminate', 'default', 'enabled', 'disabled', 'required', 'optional', 'valid'],
  ...['invalid', 'user-valid', 'user-invalid', 'in-range', 'out-of-range', 'placeholder-shown'],
  ...['read-write', 'autofill', '-webkit-autofill', 'fullscreen', '-webkit-full-screen', 'modal'],
  ...['popover-open', 'open', 'picture-in-picture', 'playing', 'paused', 'muted', 'seeking'],
  ...['buffering', 'stalled', 'volume-locked', 'active-view-transition', 'read-only'],
]);

/** States that every element is in. */
export const ALWAYS: ReadonlySet<string> = new Set(['defined']);

const PSEUDO_ELEMENTS: ReadonlySet<string> = new Set([
  ...['before', 'after', 'first-line', 'first-letter', 'marker', 'selection', 'placeholder', 'backdrop'],
  ...['file-selector-button', 'cue', 'slotted', 'part', 'highlight', 'target-text', 'spelling-error'],
  ...['grammar-error', 'details-content', 'view-transition', 'search-text', 'checkmark', 'picker-icon'],
]);

/** Whether browsers know the pseudo-element; a selector with it never selects an element. */
export function isPseudoElement(name: string): boolean {
  const lower = name.toLowerCase();
  return PSEUDO_ELEMENTS.has(lower) || lower.startsWith('-webkit-');
}
