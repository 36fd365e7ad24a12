/** Keys that belong to what has the focus rather than to the window; they are bound there. */
export interface Gesture {
  readonly keys: string;
  readonly what: string;
}

export const GESTURES: readonly { readonly where: string; readonly rows: readonly Gesture[] }[] = [
  {
    where: 'On a handle of the board',
    rows: [
      { keys: 'Tab', what: 'to the next handle' },
      { keys: '← → ↑ ↓', what: 'move it by 10 mm' },
      { keys: 'Shift + arrow', what: 'move it by 100 mm' },
      { keys: 'Alt + arrow', what: 'move it by 1 mm' },
      { keys: 'Enter', what: 'type its figure' },
      { keys: 'Esc', what: 'give the move up' },
    ],
  },
  {
    where: 'In a figure',
    rows: [
      { keys: 'Enter', what: 'take it' },
      { keys: 'Esc', what: 'put the old one back' },
      { keys: 'F1', what: 'what its name means' },
    ],
  },
  {
    where: 'On the board itself',
    rows: [
      { keys: '← → ↑ ↓', what: 'move the paper' },
      { keys: 'wheel, pinch', what: 'nearer and further' },
      { keys: 'drag', what: 'a handle, or the paper' },
    ],
  },
];
