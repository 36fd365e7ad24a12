import { expect, test } from 'vitest';
import { influencesInWords } from '../../../renderer/panels/influence.ts';
import { schemeFrom } from '../../support/assessed.ts';

const told = (thickness: number, check: string): string[] => {
  const scheme = schemeFrom({ profile: { shape: 'semicircular', span: 4 }, ring: { thickness, voussoirs: 200 } });
  return influencesInWords({ id: 'a1', schemes: [scheme] }, scheme, check);
};

test('says how far a measure would raise or lower the safety, the same measure once', () => {
  const sentences = told(0.4, 'ring.compression-only');
  expect(sentences).toHaveLength(2);
  expect(sentences[0]).toMatch(/^5 % less span would raise the safety from 1\.\d\d to 1\.\d\d\.$/);
  expect(sentences[1]).toMatch(/^5 % less thickness would lower the safety from 1\.\d\d to 1\.\d\d\.$/);
});

test('says of a ring that does not stand what would let it', () => {
  expect(told(0.22, 'ring.compression-only')).toContain('5 % more thickness would let a line of thrust fit.');
});

test('speaks of what a check asks of the stone', () => {
  expect(told(0.4, 'ring.sliding')[0]).toMatch(/the friction needed from 0\.\d+ to 0\.\d+\.$/);
});
