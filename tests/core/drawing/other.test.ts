import { describe, expect, it } from 'vitest';
import { elevation } from '../../../core/drawing/elevation.ts';
import { legendEntries } from '../../../core/drawing/legend.ts';
import type { PathItem, SceneItem } from '../../../core/drawing/scene.ts';
import { assessed, northDoor, thinRing } from './arches.ts';

const SCALE = { millimetresPerMetre: 50 };

function laid(items: readonly SceneItem[], role: string): PathItem[] {
  return items.filter((item): item is PathItem => item.kind === 'path' && item.role === role);
}

const flatter = assessed({
  profile: { shape: 'segmental', span: 3, rise: 1 },
  ring: { thickness: 0.5, voussoirs: 15, joints: 'radial' },
});

describe('another scheme laid over the elevation', () => {
  const scene = elevation(northDoor(), { ...SCALE, other: { assessed: flatter, name: 'Flatter' } });
  const items = scene.layers.find(({ name }) => name === 'other-scheme')?.items ?? [];

  it('is its outline and its two lines of thrust, each in a pen of its own', () => {
    expect(laid(items, 'other-outline')).toHaveLength(1);
    expect(laid(items, 'other-least')).toHaveLength(1);
    expect(laid(items, 'other-greatest')).toHaveLength(1);
    expect(items).toHaveLength(3);
  });

  it('stands with the middle of its springings on that of the scheme shown, though its span is less', () => {
    const [outline] = laid(items, 'other-outline');
    expect(outline!.start).toEqual({ x: expect.closeTo(-1.5, 12), y: expect.closeTo(0, 12) });
  });

  it('shows no line of thrust of a ring that does not stand', () => {
    const over = elevation(northDoor(), { ...SCALE, other: { assessed: thinRing(), name: 'Thin' } });
    const drawn = over.layers.find(({ name }) => name === 'other-scheme')?.items ?? [];
    expect(drawn.map(({ role }) => role)).toEqual(['other-outline']);
  });

  it('is named in the legend by its name, and only while it lies there', () => {
    const { resolved, result } = northDoor();
    const named = (other?: string) =>
      legendEntries(resolved, result, { other }).filter(({ words }) => words.startsWith('Flatter: '));
    expect(named('Flatter')).toHaveLength(3);
    expect(named()).toHaveLength(0);
  });
});
