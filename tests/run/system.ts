import { spawnSync } from 'node:child_process';
import { chromiumIsHere } from './chromium.ts';

/** Something that tests use and npm cannot bring. */
interface SystemTool {
  readonly name: string;
  /** Debian's package. */
  readonly debian: string;
  readonly isHere: () => boolean;
}

const answers = (command: string, args: readonly string[]): boolean =>
  spawnSync(command, args, { stdio: 'ignore' }).status === 0;

const TOOLS: readonly SystemTool[] = [
  { name: 'Chromium', debian: 'chromium', isHere: chromiumIsHere },
  {
    name: 'pdftoppm and pdftotext',
    debian: 'poppler-utils',
    isHere: () => answers('pdftoppm', ['-v']) && answers('pdftotext', ['-v']),
  },
  { name: 'ezdxf', debian: 'python3-ezdxf', isHere: () => answers('/usr/bin/python3', ['-c', 'import ezdxf']) },
];

const missing = (): SystemTool[] => TOOLS.filter((tool) => !tool.isHere());

/**
 * Installs the system tools that are missing, where this machine lets it: Debian, as root.
 * @returns the sentence to print, or null when nothing was missing.
 */
export function ensureSystemTools(): string | null {
  const wanted = missing();
  if (wanted.length === 0) return null;
  const packages = wanted.map((tool) => tool.debian);
  if (process.getuid?.() === 0 && answers('apt-get', ['--version'])) {
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    const apt = (...args: string[]) => spawnSync('apt-get', args, { stdio: ['ignore', 'inherit', 'inherit'], env });
    apt('update', '-q');
    apt('install', '-y', '-q', '--no-install-recommends', ...packages);
  }
  const left = missing();
  if (left.length === 0) return `Installed ${packages.join(', ')}.`;
  const names = left.map((tool) => tool.name).join(', ');
  return `Not on this machine and not installable here: ${names}. Tests that need them are skipped. On Debian, as root: apt-get install ${left.map((tool) => tool.debian).join(' ')}`;
}
