/** Runs `work` with the latest of what was handed in, once a frame, however often it is called. */
export function onceAFrame<Input>(work: (input: Input) => void): {
  later: (input: Input) => void;
  now: () => void;
  forget: () => void;
} {
  let waiting: { readonly input: Input } | null = null;
  let request = 0;
  const now = (): void => {
    cancelAnimationFrame(request);
    request = 0;
    const found = waiting;
    waiting = null;
    if (found !== null) work(found.input);
  };
  return {
    later: (input) => {
      waiting = { input };
      if (request === 0) request = requestAnimationFrame(now);
    },
    /** Does at once what was waiting, as a release must. */
    now,
    forget: () => {
      cancelAnimationFrame(request);
      request = 0;
      waiting = null;
    },
  };
}
