import { spawn } from 'node:child_process';
import { readFileSync, rmSync } from 'node:fs';
import { ofCheck, ofPlaywright, ofVitest, type Tally } from './tally.ts';

/** One npm script of the whole test, and how its outcome is counted. */
export interface Step {
  readonly script: string;
  readonly counts: 'check' | 'vitest' | 'playwright';
  readonly needsChromium: boolean;
}

/** A step that hangs ends here and counts as failed; the longest takes about a minute. */
const LONGEST_MS = 15 * 60_000;

/** Runs the step, its output streamed, and returns its counts. `reportFile` is a path that may be written. */
export async function runStep(step: Step, reportFile: string): Promise<Tally> {
  rmSync(reportFile, { force: true });
  switch (step.counts) {
    case 'check':
      return ofCheck(await npmRun([step.script]));
    case 'vitest': {
      const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${reportFile}`];
      return ofVitest(...(await reported(npmRun([step.script, '--', ...reporters]), reportFile)));
    }
    case 'playwright': {
      const ran = npmRun([step.script, '--', '--reporter=list,json'], { PLAYWRIGHT_JSON_OUTPUT_FILE: reportFile });
      return ofPlaywright(...(await reported(ran, reportFile)));
    }
  }
}

async function reported(ran: Promise<number>, reportFile: string): Promise<[report: string | null, exitCode: number]> {
  const exitCode = await ran;
  try {
    return [readFileSync(reportFile, 'utf8'), exitCode];
  } catch {
    return [null, exitCode];
  }
}

/** Exit code of `npm run --silent …`; 1 when it could not be started or was stopped. */
function npmRun(args: readonly string[], env: Record<string, string> = {}): Promise<number> {
  return new Promise((ended) => {
    const child = spawn('npm', ['run', '--silent', ...args], {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, ...env },
      shell: process.platform === 'win32',
      timeout: LONGEST_MS,
    });
    child.on('error', (error) => {
      console.error(error.message);
      ended(1);
    });
    child.on('close', (code) => ended(code ?? 1));
  });
}
