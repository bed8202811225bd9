#!/usr/bin/env node
import { main } from '../dist/cli/main.js';

const code = await main(process.argv.slice(2));
// A stream that failed meanwhile may have set a code of its own.
process.exitCode = Math.max(Number(process.exitCode ?? 0), code);
