import type { Comparison, Difference } from './comparison.js';
import { fineMm, mm, sideBySide } from './figures.js';

const PLACES_SHOWN = 5;

/** A comparison in a few lines for a terminal. */
export function comparisonTable(comparison: Comparison): string {
  const { before, after } = comparison;
  return [
    `${before.name} and ${after.name}`,
    ...sideBySide(before, after),
    `  lines   ${verdict(comparison)}`,
    ...differenceLines(comparison.differences),
    ...(onlyPensDiffer(comparison)
      ? [
          '  The same length is missing with one pen and added with another: --pens one looks at the lines alone.',
        ]
      : []),
  ].join('\n');
}

/** Whether as much is added with some pens as is missing with others. */
function onlyPensDiffer({ differences, missingMm, extraMm }: Comparison): boolean {
  const pens = (code: string) => new Set(differences.filter((d) => d.code === code).map(({ pen }) => pen));
  const missing = pens('line-missing');
  const apart = [...pens('line-added')].every((pen) => !missing.has(pen));
  return missingMm > 0 && apart && Math.abs(missingMm - extraMm) <= 0.01 * missingMm;
}

/** A few places of each kind; the rest counted. */
function differenceLines(differences: readonly Difference[]): string[] {
  const lines: string[] = [];
  for (const code of new Set(differences.map((difference) => difference.code))) {
    const alike = differences.filter((difference) => difference.code === code);
    for (const { message } of alike.slice(0, PLACES_SHOWN)) lines.push(`  - ${message}`);
    if (alike.length > PLACES_SHOWN) lines.push(`    … and ${alike.length - PLACES_SHOWN} more of this kind`);
  }
  return lines;
}

function verdict({ same, missingMm, extraMm, twiceMm, bridgedMm, maxDeviationMm }: Comparison): string {
  if (!same) return `DIFFER: ${mm(missingMm)} missing, ${mm(extraMm)} added, ${mm(twiceMm)} drawn again`;
  const bridged = bridgedMm > 0 ? `; ${mm(bridgedMm)} drawn across gaps` : '';
  return `the same, none lost or added; largest deviation ${fineMm(maxDeviationMm)}${bridged}`;
}
