import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { apiReference } from '../support/apiReference.ts';

const at = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));

test('the reference says what the docstrings say (npm run api makes it anew)', () => {
  const made = apiReference(at('src/core/index.ts'));
  if (process.env.FEWLIFT_API === 'write') writeFileSync(at('src/core/API.md'), made);
  expect(readFileSync(at('src/core/API.md'), 'utf8')).toBe(made);
  for (const name of ['readDrawing', 'tour', 'perfectMatching', 'writeSvg', 'writeGcode', 'audit']) {
    expect(made).toContain(`\n## ${name}\n`);
  }
});
