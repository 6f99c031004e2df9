// npm run bench: ratios and delays on this machine, for comparison of one change with another; no test looks at them.
import { ensembleRows } from './ensemble.mjs';
import { opticsRows } from './optics.mjs';
import { uploadRows } from './upload.mjs';

for (const rows of [ensembleRows, opticsRows, uploadRows]) {
  for (const line of await rows()) console.log(line);
}
