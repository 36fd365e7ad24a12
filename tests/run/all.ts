/**
 * `npm test`: every check and every test there is, in the order in which a failure is cheapest to learn of. The last
 * line is the count: `N passed, N failed`, and `, N skipped` where a machine lacks something.
 */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromiumIsHere } from './chromium.ts';
import { runStep, type Step } from './step.ts';
import { ensureSystemTools } from './system.ts';
import { closingLine, NOTHING, sum, type Tally } from './tally.ts';

const check = (script: string): Step => ({ script, counts: 'check', needsChromium: false });

const STEPS: readonly Step[] = [
  check('check'),
  check('format:check'),
  check('lint'),
  check('floors'),
  check('dead'),
  { script: 'test:unit', counts: 'vitest', needsChromium: false },
  check('build'),
  { script: 'test:component', counts: 'vitest', needsChromium: true },
  { script: 'test:e2e', counts: 'playwright', needsChromium: true },
];

const note = ensureSystemTools();
if (note !== null) console.log(note);

const folder = mkdtempSync(join(tmpdir(), 'skewback-run-'));
const results: { readonly script: string; readonly tally: Tally; readonly seconds: number }[] = [];
for (const step of STEPS) {
  console.log(`\n== ${step.script}`);
  const start = performance.now();
  const lacking = step.needsChromium && !chromiumIsHere();
  if (lacking) console.log('Skipped: there is no Chromium here.');
  const tally = lacking ? { ...NOTHING, skipped: 1 } : await runStep(step, join(folder, 'report.json'));
  results.push({ script: step.script, tally, seconds: (performance.now() - start) / 1000 });
}
rmSync(folder, { recursive: true, force: true });

console.log('');
for (const { script, tally, seconds } of results) {
  console.log(`${script.padEnd(16)} ${seconds.toFixed(1).padStart(6)} s  ${closingLine(tally)}`);
}
const all = sum(results.map((result) => result.tally));
process.exitCode = all.failed > 0 ? 1 : 0;
console.log(closingLine(all));
