import { expect, test } from 'vitest';
import { boardInWords } from '../../../renderer/board/words.ts';
import { drawnArch } from './drawn.ts';

test('the board in words says the arch, what it carries, whether it stands and where it hinges', () => {
  const words = boardInWords(drawnArch().assessed);
  expect(words).toContain('Segmental arch, span 3.00 m, rise 0.75 m.');
  expect(words).toContain('wall to 0.50 m over the crown, 20.0 kN/m³');
  expect(words).toContain('post, 6.00 kN 0.50 m right of mid-span');
  expect(words).toContain('floor, 4.00 kN/m² from 0.50 m left of mid-span to 0.30 m right of mid-span');
  expect(words).toContain('Stands in compression alone');
  expect(words).toMatch(/Least thrust of [\d.]+ kN: the line touches the ring at joint \d+ on the (in|ex)trados/);
  expect(words).toMatch(/the left support takes [\d.]+ kN sideways/);
});

test('of an arch that does not stand it says how it would turn', () => {
  const thin = drawnArch('semicircular', (scheme) => ({ ...scheme, ring: { ...scheme.ring, thickness: 0.05 } }));
  expect(boardInWords(thin.assessed)).toMatch(/Does not stand.*It turns about hinges at joint \d+/);
});
