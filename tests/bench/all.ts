/** `npm run bench`: every bench, one after the other, so that none disturbs another. */
await import('./statics.ts');
