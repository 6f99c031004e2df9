// Examples of the rules on ages, depths and sediment, one file a rule: run together so that the rules are loaded once.
import './v16-depth-order.examples.test-support';
import './v17-age-order.examples.test-support';
import './v18-age-datum.examples.test-support';
import './v22-radiocarbon.examples.test-support';
import './v25-luminescence.examples.test-support';
import './v26-sedimentation-rate.examples.test-support';
import './v27-rate-jump.examples.test-support';
import './v29-density-range.examples.test-support';
import './v30-density-basis.examples.test-support';
import './v31-wet-density.examples.test-support';
