/** `unknown` means that not enough is given to say; it is never shown as a pass. */
export type Status = 'holds' | 'narrow' | 'fails' | 'unknown';

/** One verdict with its figure, its limit, its place and its ground. */
export interface Check {
  readonly id: string;
  readonly title: string;
  readonly status: Status;
  readonly demand: number | null;
  readonly limit: number | null;
  /** demand / limit. */
  readonly utilisation: number | null;
  readonly unit: string;
  /** Such as `joint 4`, or empty. */
  readonly where: string;
  /** The same place as joint numbers. */
  readonly joints: readonly number[];
  readonly because: string;
  readonly source: string;
}

/** `joint 4`, `joints 4, 10 and 16`, or nothing. */
export function jointsInWords(joints: readonly number[]): string {
  if (joints.length === 0) return '';
  if (joints.length === 1) return `joint ${joints[0]}`;
  return `joints ${joints.slice(0, -1).join(', ')} and ${joints[joints.length - 1]}`;
}
