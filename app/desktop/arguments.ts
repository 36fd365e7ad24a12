import { resolve } from 'node:path';

/**
 * The files named on a command line that started the program, as full paths.
 * @param argv the program first; from sources, Electron first and then the project's folder
 * @param workingFolder where the person stood
 */
export function filesNamed(argv: readonly string[], workingFolder: string, packaged: boolean): string[] {
  return argv
    .slice(packaged ? 1 : 2)
    .filter((argument) => argument !== '' && !argument.startsWith('-'))
    .map((argument) => resolve(workingFolder, argument));
}
