import { readFileSync } from 'node:fs';
import { dirname, resolve } from 'node:path';

/**
 * The reference of the library, made from its docstrings: every name that `src/core/index.ts` exports,
 * with its declaration and the comment above it, in Markdown, in the order of the exports.
 */
export function apiReference(indexPath: string): string {
  const index = readFileSync(indexPath, 'utf8');
  const sections: string[] = [
    '# The library',
    '',
    'Made from the docstrings by `npm run api`; do not edit. Lengths in mm, times in seconds, y down, the origin at the top left of the page.',
  ];
  for (const [, names, from] of index.matchAll(/export (?:type )?\{([^}]*)\} from '([^']+)';/g)) {
    const module = readFileSync(resolve(dirname(indexPath), from.replace(/\.js$/, '.ts')), 'utf8');
    for (const part of names.split(',')) {
      const [original, alias] = part
        .replace(/\btype\b/, '')
        .trim()
        .split(/\s+as\s+/);
      if (original) sections.push('', ...entry(module, original, alias ?? original));
    }
  }
  return `${sections.join('\n')}\n`;
}

function entry(module: string, original: string, name: string): string[] {
  const declared = new RegExp(
    `(?:/\\*\\*((?:[^*]|\\*(?!/))*)\\*/\\n)?export (?:type|interface|const|function|class) ${original}\\b`,
  ).exec(module);
  if (!declared) throw new Error(`${original} is exported but not declared where it should be`);
  const at = declared.index + declared[0].lastIndexOf('export');
  const code = declarationAt(module, at).replace(new RegExp(`\\b${original}\\b`), name);
  const doc = (declared[1] ?? '')
    .split('\n')
    .map((line) => line.replace(/^\s*\* ?/, '').trimEnd())
    .join('\n')
    .trim();
  return [`## ${name}`, '', ...(doc ? [doc, ''] : []), '```ts', code, '```'];
}

/** The declaration without a function's body or a constant's value. */
function declarationAt(module: string, at: number): string {
  const text = module.slice(at).replace(/^export /, '');
  if (text.startsWith('function')) return signatures(text);
  if (text.startsWith('const')) return `${text.slice(0, text.indexOf(' = ')).trimEnd()};`;
  if (text.startsWith('type')) return text.slice(0, text.indexOf(';') + 1);
  return text.slice(0, text.indexOf('\n}\n') + 2);
}

/** A function's signature, or those of all its overloads: each ends at a semicolon or at the body's brace. */
function signatures(text: string, overloaded = false): string {
  let depth = 0;
  for (let i = 0; i < text.length; i++) {
    const c = text[i];
    if (c === '(' || c === '[' || c === '<') depth++;
    else if (c === ')' || c === ']' || (c === '>' && text[i - 1] !== '=')) depth--;
    else if (depth > 0) continue;
    else if (c === ';') {
      const rest = text.slice(i + 1).trimStart();
      const isOverload = rest.startsWith('export function ') && nameAfter(rest) === nameAfter(text);
      if (!isOverload) return text.slice(0, i + 1);
      return `${text.slice(0, i + 1)}\n${signatures(rest.replace(/^export /, ''), true)}`.trimEnd();
    } else if (c === '{') {
      if (/[:|&<]\s*$/.test(text.slice(0, i))) i = closing(text, i);
      // What implements overloads is not for callers.
      else return overloaded ? '' : `${text.slice(0, i).trimEnd()};`;
    }
  }
  throw new Error('a function without an end');
}

function nameAfter(text: string): string | undefined {
  return /function (\w+)/.exec(text)?.[1];
}

/** The index of the brace that closes the one at `open`. */
function closing(text: string, open: number): number {
  let depth = 0;
  for (let i = open; i < text.length; i++) {
    if (text[i] === '{') depth++;
    else if (text[i] === '}' && --depth === 0) return i;
  }
  throw new Error('a brace is not closed');
}
