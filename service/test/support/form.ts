import type { submissionMetadata } from '@siltlight/common/wire/submissions';
import type { z } from 'zod';

/** The metadata form with every wanted answer. */
export const answers: z.infer<typeof submissionMetadata> = {
  title: 'Dust fluxes of two ice cores',
  creators: [{ name: 'Ilka Vossberg', orcid: '0000-0002-1825-0097' }],
  licence: 'CC-BY-4.0',
  publicationDoi: '10.1038/nature06763',
  archive: 'ice',
  method: 'Coulter counter',
  sizeCutoff: 'bulk',
  dustDefinition: 'insoluble',
  ageDatum: 'BP1950',
  ageModel: 'EDC3',
  uncertaintyMeaning: 'standard-error',
};
