// Examples of the rules on fluxes and tracers, one file a rule: run together so that the rules are loaded once.
import './v32-flux-sign.examples.test-support';
import './v33-flux-ice.examples.test-support';
import './v34-flux-marine.examples.test-support';
import './v35-flux-loess.examples.test-support';
import './v36-flux-peat-lake.examples.test-support';
import './v37-flux-identity.examples.test-support';
import './v39-below-detection.examples.test-support';
import './v40-precision.examples.test-support';
import './v41-dust-definition.examples.test-support';
import './v42-dust-fraction.examples.test-support';
import './v43-tracer.examples.test-support';
import './v44-normalisation.examples.test-support';
import './v45-thorium-limits.examples.test-support';
import './v46-ice-rafted.examples.test-support';
import './v48-volcanic-ash.examples.test-support';
import './v49-local-material.examples.test-support';
import './v50-soil-formation.examples.test-support';
