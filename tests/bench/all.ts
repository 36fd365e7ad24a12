/** `npm run bench`: every bench, one after the other, so that none disturbs another. */
import './statics.ts';
import './supports.ts';
import './frames.ts';
