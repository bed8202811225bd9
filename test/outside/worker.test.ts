import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { expect, test } from 'vitest';
import { DEFAULT_SETTINGS, PEN_ON_Z, readDrawing, tour, writeAudited } from '../../src/core/index.ts';
import { CHROMIUM, useBrowser } from '../support/browser.ts';
import { SAMPLES } from '../support/runCli.ts';

const CORE = fileURLToPath(new URL('../../src/core/index.ts', import.meta.url));

/** The core as one module for the browser; fails where anything in it needs Node. */
async function bundle(): Promise<string> {
  const outDir = mkdtempSync(join(tmpdir(), 'fewlift-bundle-'));
  try {
    await build({
      configFile: false,
      logLevel: 'error',
      build: { outDir, minify: false, lib: { entry: CORE, formats: ['es'], fileName: () => 'core.js' } },
    });
    return readFileSync(join(outDir, 'core.js'), 'utf8');
  } finally {
    rmSync(outDir, { recursive: true, force: true });
  }
}

const WORKER = `
import { DEFAULT_SETTINGS, PEN_ON_Z, readDrawing, tour, writeAudited } from './core.js';
onmessage = ({ data }) => {
  const { text, name } = data;
  const ordered = tour(readDrawing(text, { name }), { ...DEFAULT_SETTINGS, effort: 2 }, PEN_ON_Z);
  const written = ['svg', 'gcode'].map((kind) => writeAudited(ordered, kind));
  postMessage(written.map(({ text, audit }) => ({ text, ok: audit.ok })));
};
postMessage('ready');
`;

const browser = useBrowser();

test.skipIf(CHROMIUM === null)(
  'the core runs in a worker of a browser and writes the same bytes as here',
  async () => {
    const core = await bundle();
    const server = createServer((request, response) => {
      const served: Record<string, [string, string]> = {
        '/': ['text/html', '<!doctype html><title>worker</title>'],
        '/core.js': ['text/javascript', core],
        '/worker.js': ['text/javascript', WORKER],
      };
      const [type, body] = served[request.url ?? ''] ?? ['text/plain', ''];
      response.setHeader('content-type', type);
      response.end(body);
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    try {
      const page = await browser().newPage();
      await page.goto(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`);
      for (const name of ['board-three-layers.svg', 'motif-sheet.svg', 'hatched-leaf.svg']) {
        const text = readFileSync(SAMPLES + name, 'utf8');
        const there = await page.evaluate(inWorker, { text, name });
        const ordered = tour(readDrawing(text, { name }), { ...DEFAULT_SETTINGS, effort: 2 }, PEN_ON_Z);
        const here = (['svg', 'gcode'] as const).map((kind) => writeAudited(ordered, kind));
        expect(there.map(({ ok }) => ok)).toEqual([true, true]);
        expect(there.map(({ text: written }) => written)).toEqual(here.map(({ text: written }) => written));
      }
    } finally {
      server.close();
    }
  },
);

/** Runs in the page: hands a drawing to the worker and waits for what it writes. */
function inWorker(job: { text: string; name: string }): Promise<{ text: string; ok: boolean }[]> {
  interface PageWorker {
    onmessage: ((event: { data: unknown }) => void) | null;
    onerror: ((event: { message: string }) => void) | null;
    postMessage(data: unknown): void;
  }
  type WorkerMaker = new (url: string, options: { type: string }) => PageWorker;
  const Maker = (globalThis as unknown as { Worker: WorkerMaker }).Worker;
  return new Promise((resolve, reject) => {
    const worker = new Maker('/worker.js', { type: 'module' });
    worker.onerror = ({ message }) => reject(new Error(message));
    worker.onmessage = ({ data }) => {
      if (data === 'ready') worker.postMessage(job);
      else resolve(data as { text: string; ok: boolean }[]);
    };
  });
}
