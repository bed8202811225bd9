// Orders every sample to SVG and G-code in out/ and prints the table of each: `npm run demo`.
import { mkdirSync, readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { main } from '../dist/cli/main.js';

const samples = fileURLToPath(new URL('.', import.meta.url));
const out = fileURLToPath(new URL('../out/', import.meta.url));
/** What a sample's recipe asks for beside the defaults. */
const asked = { 'gift-box': ['--dashes', 'solid'] };
mkdirSync(out, { recursive: true });
process.chdir(fileURLToPath(new URL('..', import.meta.url)));
for (const file of readdirSync(samples).filter((name) => name.endsWith('.svg'))) {
  const name = file.replace(/\.svg$/, '');
  const outputs = ['svg', 'gcode', 'json'].flatMap((kind) => ['-o', `out/${name}.${kind}`]);
  process.exitCode = Math.max(
    process.exitCode ?? 0,
    await main(['tour', `samples/${file}`, '--show-travel', ...(asked[name] ?? []), ...outputs]),
  );
  console.log();
}
