/** Small drawings by name, each with one thing that a browser and we must see alike. */
export type Cases = Readonly<Record<string, string>>;

/** A root of 200 px × 160 px. */
export const page = (body: string, attributes = '') =>
  `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" width="200" height="160" fill="none" stroke="black" ${attributes}>${body}</svg>`;

/** A root that says all else itself. */
export const root = (attributes: string, body: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" fill="none" stroke="black" ${attributes}>${body}</svg>`;

export const LINE = '<path d="M10 20L40 60"/>';
export const SQUIGGLE = '<path d="M5 5q10 20 20 0t20 0s5 9 9 3a6 4 20 1 1 8 8z"/>';
