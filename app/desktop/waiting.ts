/** Holds news until somebody listens, then passes it on in order. */
export interface Waiting<News> {
  give(news: News): void;
  /** Whoever listens from now on; what waited is handed over at once. Null: nobody again, as when the page reloads. */
  listener(listener: ((news: News) => void) | null): void;
}

export function waiting<News>(): Waiting<News> {
  const held: News[] = [];
  let heard: ((news: News) => void) | null = null;
  return {
    give(news) {
      if (heard === null) held.push(news);
      else heard(news);
    },
    listener(listener) {
      heard = listener;
      if (listener !== null) for (const news of held.splice(0)) listener(news);
    },
  };
}
