import type { Job } from '../../core/job/schema.ts';

/** A title as a file name that every system takes: plain letters, digits and hyphens; `arch` where none are left. */
function fileNameOf(title: string): string {
  const plain = title
    .normalize('NFKD')
    .replace(/\p{Mn}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
    .slice(0, 60);
  return plain === '' ? 'arch' : plain;
}

export function jobFileName({ title }: Job): string {
  return `${fileNameOf(title ?? '')}.skewback`;
}
