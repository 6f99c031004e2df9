// Examples of the rules on cells, units and places, one file a rule: run together so that the rules are loaded once.
import './v01-file-layout.examples.test-support';
import './v02-spreadsheet-cells.examples.test-support';
import './v03-unreadable-value.examples.test-support';
import './v04-missing-codes.examples.test-support';
import './v05-required-fields.examples.test-support';
import './v06-unit.examples.test-support';
import './v07-column-median.examples.test-support';
import './v08-concentration-alone.examples.test-support';
import './v09-coordinate-range.examples.test-support';
import './v10-coordinate-precision.examples.test-support';
import './v11-swapped-coordinates.examples.test-support';
import './v12-archive-surface.examples.test-support';
import './v13-elevation-range.examples.test-support';
import './v15-site-names.examples.test-support';
