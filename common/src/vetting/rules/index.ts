import type { Rule } from '../rule';
import { notRunRules } from './not-run';
import { fileLayout } from './v01-file-layout';
import { spreadsheetCells } from './v02-spreadsheet-cells';
import { unreadableValue } from './v03-unreadable-value';
import { missingCodes } from './v04-missing-codes';
import { requiredFields } from './v05-required-fields';
import { unit } from './v06-unit';
import { columnMedian } from './v07-column-median';
import { concentrationAlone } from './v08-concentration-alone';
import { coordinateRange } from './v09-coordinate-range';
import { coordinatePrecision } from './v10-coordinate-precision';
import { swappedCoordinates } from './v11-swapped-coordinates';
import { archiveSurface } from './v12-archive-surface';
import { elevationRange } from './v13-elevation-range';
import { siteNames } from './v15-site-names';
import { depthOrder } from './v16-depth-order';
import { ageOrder } from './v17-age-order';
import { ageDatum } from './v18-age-datum';
import { radiocarbon } from './v22-radiocarbon';
import { luminescence } from './v25-luminescence';
import { sedimentationRate } from './v26-sedimentation-rate';
import { rateJump } from './v27-rate-jump';
import { densityRange } from './v29-density-range';
import { densityBasis } from './v30-density-basis';
import { wetDensity } from './v31-wet-density';
import { fluxSign } from './v32-flux-sign';
import { fluxIce } from './v33-flux-ice';
import { fluxMarine } from './v34-flux-marine';
import { fluxLoess } from './v35-flux-loess';
import { fluxPeatLake } from './v36-flux-peat-lake';
import { fluxIdentity } from './v37-flux-identity';
import { belowDetection } from './v39-below-detection';
import { precision } from './v40-precision';
import { dustDefinition } from './v41-dust-definition';
import { dustFraction } from './v42-dust-fraction';
import { tracer } from './v43-tracer';
import { normalisation } from './v44-normalisation';
import { thoriumLimits } from './v45-thorium-limits';
import { iceRafted } from './v46-ice-rafted';
import { volcanicAsh } from './v48-volcanic-ash';
import { localMaterial } from './v49-local-material';
import { soilFormation } from './v50-soil-formation';
import { sizeCutoff } from './v51-size-cutoff';
import { fineBelowBulk } from './v52-fine-below-bulk';
import { sizeMethod } from './v53-size-method';
import { uncertainty } from './v54-uncertainty';
import { relativeUncertainty } from './v55-relative-uncertainty';
import { heldDuplicates } from './v56-held-duplicates';
import { repeatedSample } from './v57-repeated-sample';
import { neighbours } from './v58-neighbours';
import { fewNeighbours } from './v59-few-neighbours';
import { opticalDepthRange } from './v61-optical-depth-range';
import { wavelength } from './v62-wavelength';
import { wavelengthConversion } from './v63-wavelength-conversion';
import { angstromExponent } from './v64-angstrom-exponent';
import { aerosolSpecies } from './v65-aerosol-species';
import { humidityState } from './v66-humidity-state';
import { scatteringRange } from './v69-scattering-range';
import { months } from './v70-months';
import { days } from './v71-days';
import { cloudScreening } from './v72-cloud-screening';
import { reference } from './v77-reference';
import { orcid } from './v78-orcid';
import { licence } from './v79-licence';
import { differences } from './v80-differences';

const runRules: Rule[] = [
  fileLayout,
  spreadsheetCells,
  unreadableValue,
  missingCodes,
  requiredFields,
  unit,
  columnMedian,
  concentrationAlone,
  coordinateRange,
  coordinatePrecision,
  swappedCoordinates,
  archiveSurface,
  elevationRange,
  siteNames,
  depthOrder,
  ageOrder,
  ageDatum,
  radiocarbon,
  luminescence,
  sedimentationRate,
  rateJump,
  densityRange,
  densityBasis,
  wetDensity,
  fluxSign,
  fluxIce,
  fluxMarine,
  fluxLoess,
  fluxPeatLake,
  fluxIdentity,
  belowDetection,
  precision,
  dustDefinition,
  dustFraction,
  tracer,
  normalisation,
  thoriumLimits,
  iceRafted,
  volcanicAsh,
  localMaterial,
  soilFormation,
  sizeCutoff,
  fineBelowBulk,
  sizeMethod,
  uncertainty,
  relativeUncertainty,
  heldDuplicates,
  repeatedSample,
  neighbours,
  fewNeighbours,
  opticalDepthRange,
  wavelength,
  wavelengthConversion,
  angstromExponent,
  aerosolSpecies,
  humidityState,
  scatteringRange,
  months,
  days,
  cloudScreening,
  reference,
  orcid,
  licence,
  differences,
];

/** Every rule of field practice once, in the order of the ids. A new rule is its file, its test and a line above. */
export const rules: readonly Rule[] = [...runRules, ...notRunRules].sort((a, b) => a.id.localeCompare(b.id));
