/** How this person wants figures shown and read; kept on this machine, never in a job. */
import type { Preferences } from '../../core/quantity/kinds.ts';

export type Units = Preferences['units'];
export type Decimal = Preferences['decimal'];

const KEY = 'skewback.figures';
const UNITS: readonly Units[] = ['m', 'mm', 'ft-in'];
const DECIMALS: readonly Decimal[] = ['point', 'comma'];

class Display {
  units = $state<Units>('m');
  decimal = $state<Decimal>('point');

  /** Takes up what was chosen before; once, when the page starts. */
  start(): void {
    const [units, decimal] = (localStorage.getItem(KEY) ?? '').split(' ');
    this.units = UNITS.find((one) => one === units) ?? this.units;
    this.decimal = DECIMALS.find((one) => one === decimal) ?? this.decimal;
  }

  choose(choice: Partial<Pick<Display, 'units' | 'decimal'>>): void {
    Object.assign(this, choice);
    localStorage.setItem(KEY, `${this.units} ${this.decimal}`);
  }
}

export const display = new Display();
