import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

export interface WholeCosts {
  readonly n: number;
  /** Costs of the pairs (0,1), (0,2), … (n−2,n−1). */
  readonly cost: readonly number[];
}

/** Why networkx cannot be asked here; null where it can. */
export function networkxMissing(): string | null {
  const probe = spawnSync('python3', ['-c', 'import networkx'], { encoding: 'utf8' });
  if (probe.error !== undefined) return 'python3 is not installed here';
  return probe.status === 0 ? null : 'python3 has no networkx here (Debian: python3-networkx)';
}

/** Totals of minimum-weight perfect matchings by networkx, all in one process. */
export function networkxTotals(cases: readonly WholeCosts[]): number[] {
  const script = fileURLToPath(new URL('./networkxMatching.py', import.meta.url));
  const run = spawnSync('python3', [script], {
    input: JSON.stringify(cases),
    encoding: 'utf8',
    maxBuffer: 2 ** 28,
  });
  if (run.status !== 0) throw new Error(`networkx failed: ${run.stderr}`);
  return JSON.parse(run.stdout) as number[];
}
