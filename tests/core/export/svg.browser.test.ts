import { afterAll, beforeAll, expect, it } from 'vitest';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { textWidth } from '../../../core/drawing/text.ts';
import { sheetToSvg } from '../../../core/export/svg.ts';
import regular from '../../../assets/fonts/dejavu-sans.woff2?url';
import bold from '../../../assets/fonts/dejavu-sans-bold.woff2?url';
import { northDoor, SHEET_TITLE, thinRing } from '../drawing/arches.ts';

let host: HTMLElement;

beforeAll(async () => {
  for (const [url, weight] of [
    [regular, 'normal'],
    [bold, 'bold'],
  ] as const) {
    document.fonts.add(await new FontFace('DejaVu Sans', `url(${url})`, { weight }).load());
  }
  host = document.createElement('div');
  document.body.append(host);
});

afterAll(() => host.remove());

it.each([
  ['standing', northDoor()],
  ['falling', thinRing()],
])('is XML to the browser’s strict reader, and every line is as long as the core says: %s', (_, arch) => {
  const sheet = elevationSheet(arch, { ...SHEET_TITLE, owner: 'R & J <Masons>', approvedBy: 'Ж. Δελτα ≤ ½' });
  const read = new DOMParser().parseFromString(sheetToSvg(sheet), 'image/svg+xml');
  expect(read.querySelector('parsererror')).toBeNull();
  host.replaceChildren(document.importNode(read.documentElement, true));

  const shown = [...host.querySelectorAll('text')].filter((text) => text.textContent !== '');
  const items = sheet.views.flatMap(({ scene }) => scene.layers.flatMap(({ items }) => items));
  const lettered = items.flatMap((item) => (item.kind === 'text' && item.text !== '' ? [item] : []));
  expect(shown.map((text) => text.textContent)).toEqual(lettered.map(({ text }) => text));
  shown.forEach((text, i) => {
    const { text: words, height, face } = lettered[i]!;
    const width = textWidth(words, height, face);
    // Geometric precision measures at the size in user units, a few pixels, in sixty-fourths: a little short of true.
    expect(text.getComputedTextLength()).toBeLessThan(1.001 * width + 0.01);
    expect(text.getComputedTextLength()).toBeGreaterThan(0.99 * width - 0.01);
  });
});
