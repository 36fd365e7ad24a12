/**
 * `npm run assess`: job files in, assessments and drawings out, by the very functions that the app uses. Answers go to
 * standard output, problems to standard error, and the exit status tells a script which.
 */
import { assess } from './assess.ts';
import { readOptions, USAGE } from './options.ts';

// A reader that has seen enough (`| head`) closes the pipe; that is no failure of ours.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') process.exit();
  throw error;
});

const asked = readOptions(process.argv.slice(2));
switch (asked.kind) {
  case 'tell':
    console.log(asked.text);
    break;
  case 'refused':
    console.error(`${asked.reason}.\n\n${USAGE}`);
    process.exitCode = 2;
    break;
  case 'assess':
    process.exitCode = await assess(asked.options, {
      // npm starts scripts in the project's folder; file names are meant from where the person stands.
      folder:
        process.env['npm_lifecycle_event'] === 'assess' ? (process.env['INIT_CWD'] ?? process.cwd()) : process.cwd(),
      input: process.stdin,
      answer: (line) => console.log(line),
      complain: (line) => console.error(line),
    });
}
