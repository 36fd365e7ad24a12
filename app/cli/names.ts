import { basename, extname } from 'node:path';

/**
 * Names for the drawings of several job files in one folder: the job file's name, then the drawing's. Two jobs of the
 * same name in different folders do not write over each other: the later one's drawings get a number.
 */
export function fileNames(): (file: string, drawing: string) => string {
  const taken = new Set<string>();
  return (file, drawing) => {
    const stem = file === '-' ? 'standard-input' : basename(file, extname(file));
    const ending = extname(drawing);
    for (let number = 1; ; number++) {
      const name = `${stem}-${basename(drawing, ending)}${number === 1 ? '' : `-${number}`}${ending}`;
      // Some disks do not tell capitals apart.
      const key = name.toLowerCase();
      if (!taken.has(key)) {
        taken.add(key);
        return name;
      }
    }
  };
}
