import { readColour } from './style/colour.js';

/** Whether a pen is what somebody calls it: upper and lower case alike, colours in any spelling. */
export function isNamed(pen: { readonly name: string; readonly was: string }, name: string): boolean {
  const wanted = canonical(name);
  return canonical(pen.name) === wanted || canonical(pen.was) === wanted;
}

function canonical(name: string): string {
  const plain = name.trim().toLowerCase();
  const dashed = /^(.*\S)\s+dashed$/.exec(plain);
  if (dashed) return `${readColour(dashed[1])?.hex ?? dashed[1]} dashed`;
  return readColour(plain)?.hex ?? plain;
}
