// npm run bench: ratios and delays on this machine, for comparison of one change with another; no test looks at them.
import { ensembleRows } from './ensemble.mjs';
import { uploadRows } from './upload.mjs';

for (const rows of [ensembleRows, uploadRows]) {
  for (const line of await rows()) console.log(line);
}
