import { expect, test } from 'vitest';
import { momentText } from '../../../renderer/session/moments.ts';

const NOW = new Date(2026, 4, 14, 16, 30);
const at = (...[year, month, day, hour, minute]: [number, number, number, number, number]): string =>
  momentText(new Date(year, month, day, hour, minute).toISOString(), NOW);

test('the hour today, the day before it for others, the year where it is another', () => {
  expect(at(2026, 4, 14, 9, 5)).toBe('today, 09:05');
  expect(at(2026, 4, 13, 23, 59)).toBe('13 May, 23:59');
  expect(at(2025, 11, 1, 8, 0)).toBe('1 December 2025, 08:00');
});
