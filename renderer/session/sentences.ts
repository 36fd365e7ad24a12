import type { Problem } from '../../core/job/problem.ts';

/** A problem beside the thing it is about, where its path would only repeat what the eye sees. */
export function plainSentence({ wrong, value, right }: Problem): string {
  const found = value === '' ? '' : ` (found ${value})`;
  return `${wrong.charAt(0).toUpperCase()}${wrong.slice(1)}${found}; ${right}.`;
}

export function plainSentences(problems: readonly Problem[]): string {
  return problems.map(plainSentence).join(' ');
}
