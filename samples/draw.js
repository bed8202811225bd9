// Draws the samples, so that they can be redrawn and changed: `node samples/draw.js`.
// Everything here is invented; the same script gives the same bytes.
import { writeFileSync } from 'node:fs';
import { samples } from './draw/samples.js';

for (const [name, draw] of Object.entries(samples)) {
  writeFileSync(new URL(name, import.meta.url), draw());
}
