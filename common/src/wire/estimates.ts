import { z } from 'zod';
import { caution, interval, isoTime, personMark } from './shared';

export const estimateMethodId = z.enum(['thin-layer-daily', 'thin-layer', 'simple-albedo', 'efficiency']);
export type EstimateMethodId = z.infer<typeof estimateMethodId>;

/** What an estimate pins and how it is computed. */
export const estimateRequest = z
  .object({
    title: z.string().trim().min(1).max(200).optional(),
    fieldVersionId: z.string().max(64),
    opticalSetVersionId: z.string().max(64),
    backdropVersionId: z.string().max(64),
    method: estimateMethodId,
    transmittance: z.number().min(0.3).max(1),
    longwave: z.object({ on: z.boolean(), efficiencyWm2: z.number().min(-20).max(60) }),
    /** shortwave efficiency [W m-2 per unit optical depth], used by the method "efficiency" alone */
    shortwaveEfficiencyWm2: z.number().min(-150).max(150).optional(),
    members: z.number().int().min(64).max(4096),
    seed: z.number().int().min(0).max(4_294_967_295),
  })
  .strict();
export type EstimateRequest = z.infer<typeof estimateRequest>;

export const opticalSetView = z.object({
  versionId: z.string(),
  slug: z.string(),
  title: z.string(),
  number: z.number().int(),
  checksum: z.string(),
  singleScatteringAlbedo: z.object({ low: z.number(), central: z.number(), high: z.number() }),
  asymmetry: z.object({ low: z.number(), central: z.number(), high: z.number() }),
  massExtinctionM2PerG: z.object({ low: z.number(), central: z.number(), high: z.number() }),
  wavelengthUm: z.number(),
  sizeCutoff: z.string(),
  source: z.string(),
  evidence: z.string(),
  note: z.string(),
});
export type OpticalSetView = z.infer<typeof opticalSetView>;

export const backdropView = z.object({
  versionId: z.string(),
  slug: z.string(),
  title: z.string(),
  number: z.number().int(),
  checksum: z.string(),
  source: z.string(),
  note: z.string(),
  bands: z.array(
    z.object({
      southDeg: z.number(),
      northDeg: z.number(),
      surfaceAlbedo: z.number(),
      cloudFraction: z.number(),
      cloudFractionLand: z.number().nullable(),
      cloudFractionOcean: z.number().nullable(),
    }),
  ),
});
export type BackdropView = z.infer<typeof backdropView>;

/** Shortwave, longwave and net of one kind, sky and place. */
export const forcingTriple = z.object({ shortwaveWm2: interval, longwaveWm2: interval, netWm2: interval });
export type ForcingTriple = z.infer<typeof forcingTriple>;

/** The same under a clear sky; a part is null where its efficiency belongs to all sky alone. */
export const clearSkyTriple = z.object({
  shortwaveWm2: interval.nullable(),
  longwaveWm2: interval.nullable(),
  netWm2: interval.nullable(),
});

export const estimateRegionResult = z.object({
  code: z.string(),
  name: z.string(),
  areaShare: z.number(),
  siteCount: z.number().int(),
  hatched: z.boolean(),
  status: z.enum(['sites', 'shrunk', 'global']),
  opticalDepthSlice: z.number(),
  opticalDepthReference: z.number(),
  surfaceAlbedo: z.number(),
  cloudFraction: z.number(),
  /** slice minus reference */
  forcing: forcingTriple,
  /** slice with this air minus slice without aerosol */
  directEffect: forcingTriple,
  cautions: z.array(caution),
});
export type EstimateRegionResult = z.infer<typeof estimateRegionResult>;

export const estimateResult = z.object({
  label: z.object({
    level: z.literal('top of atmosphere'),
    sky: z.literal('all sky'),
    kind: z.literal('instantaneous, no rapid adjustments'),
    sliceName: z.string(),
    referenceName: z.string(),
    processes: z.string(),
  }),
  global: z.object({
    forcing: forcingTriple,
    forcingClearSky: clearSkyTriple,
    directEffect: forcingTriple,
    directEffectReference: forcingTriple,
    /** dust in the air behind the optical depths [Tg] */
    burdenSliceTg: z.number(),
    burdenReferenceTg: z.number(),
    opticalDepthSlice: z.number(),
    opticalDepthReference: z.number(),
  }),
  /** 50 equally likely outcomes of the global net forcing, ascending [W m-2] */
  outcomes: z.array(z.number()),
  /** global mean by month, W m-2; null where the method has no months */
  monthly: z
    .array(
      z.object({
        month: z.number().int(),
        shortwaveWm2: z.number(),
        longwaveWm2: z.number(),
        netWm2: z.number(),
      }),
    )
    .nullable(),
  criticalSingleScatteringAlbedo: z.number().nullable(),
  regions: z.array(estimateRegionResult),
  /** places in no region: with them the regions add up to the globe */
  outside: z.object({ areaShare: z.number(), forcing: forcingTriple }),
  varied: z.array(
    z.object({
      name: z.string(),
      unit: z.string(),
      distribution: z.string(),
      low: z.number(),
      central: z.number(),
      high: z.number(),
      source: z.string(),
    }),
  ),
  cautions: z.array(caution),
});
export type EstimateResult = z.infer<typeof estimateResult>;

export const estimateState = z.enum([
  'queued',
  'running',
  'failed',
  'cancelled',
  'computed',
  'published',
  'superseded',
  'withdrawn',
]);

export const estimateSummary = z.object({
  id: z.string(),
  /** "run 12" */
  runNumber: z.number().int(),
  title: z.string(),
  state: estimateState,
  sliceSlug: z.string(),
  sliceName: z.string(),
  referenceName: z.string(),
  method: estimateMethodId,
  netWm2: interval.nullable(),
  stale: z.boolean(),
  staleReason: z.string().nullable(),
  invented: z.boolean(),
  createdBy: personMark,
  createdAt: isoTime,
  publishedBy: personMark.nullable(),
  publishedAt: isoTime.nullable(),
});
export type EstimateSummary = z.infer<typeof estimateSummary>;

export const estimateDetail = estimateSummary.extend({
  jobId: z.string().nullable(),
  checksum: z.string().nullable(),
  request: estimateRequest,
  fieldTitle: z.string(),
  opticalSetTitle: z.string(),
  backdropTitle: z.string(),
  result: estimateResult.nullable(),
  /** beside it, for scale */
  context: z.object({
    greenhouse: z.object({ valueWm2: z.number(), formula: z.string(), source: z.string() }).nullable(),
    published: z.array(
      z.object({
        id: z.string(),
        source: z.string(),
        quantity: z.string(),
        valueWm2: z.number(),
        lowWm2: z.number().nullable(),
        highWm2: z.number().nullable(),
        evidence: z.string(),
        /** null: the same kind; else why it is greyed */
        otherKind: z.string().nullable(),
        note: z.string(),
      }),
    ),
  }),
  rights: z.object({ maySignOff: z.boolean(), mayWithdraw: z.boolean(), whyNot: z.string().nullable() }),
});
export type EstimateDetail = z.infer<typeof estimateDetail>;

export const estimateAccepted = z.object({ id: z.string(), jobId: z.string(), jobPath: z.string() });
export const estimatesQuery = z.object({
  slice: z.string().max(80).optional(),
  state: estimateState.optional(),
});
