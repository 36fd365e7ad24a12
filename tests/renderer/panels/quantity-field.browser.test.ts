import { expect, test, vi } from 'vitest';
import { page, userEvent } from 'vitest/browser';
import { render } from 'vitest-browser-svelte';
import QuantityField from '../../../renderer/panels/QuantityField.svelte';

type Enter = (value: number, shown: string) => string | null;

async function spanField(enter: Enter) {
  await render(QuantityField, { label: 'Span', kind: 'length', value: 3.2, enter, forget: null });
  return page.getByLabelText('Span');
}

test('feet and inches are understood while typed, and taken by Enter', async () => {
  const enter = vi.fn<Enter>(() => null);
  const field = await spanField(enter);
  await field.fill(`8' 3 1/2"`);
  await expect.element(page.getByText('= 2.5273')).toBeVisible();
  await userEvent.keyboard('{Enter}');
  await vi.waitFor(() => expect(enter).toHaveBeenCalledOnce());
  expect(enter.mock.calls[0]?.[0]).toBeCloseTo(2.5273, 4);
});

test('what cannot be understood is explained and not taken; Esc brings the figure back', async () => {
  const enter = vi.fn<Enter>(() => null);
  const field = await spanField(enter);
  await field.fill('three paces');
  await userEvent.keyboard('{Enter}');
  await expect.element(page.getByText('Three is no unit known here.')).toBeVisible();
  await expect.element(field).toHaveAttribute('aria-invalid', 'true');
  expect(enter).not.toHaveBeenCalled();
  await userEvent.keyboard('{Escape}');
  await expect.element(field).toHaveAttribute('aria-invalid', 'false');
  await expect.element(field).toHaveValue('3.2\u00a0m');
});

test('what the arch refuses is explained in the words of the refusal', async () => {
  const field = await spanField(() => 'At most 3 m is possible here.');
  await field.fill('4');
  await userEvent.keyboard('{Enter}');
  await expect.element(page.getByText('At most 3 m is possible here.')).toBeVisible();
});
