import { Injectable } from '@nestjs/common';
import { calculateGreenhouse } from '@siltlight/common/forcing/greenhouse';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import type { SliceContent } from '@siltlight/common/wire/slices';
import { SlicesService } from '../slices/slices.service';
import { publishedMarks } from './published-marks';

/** What stands beside an estimate for scale, against the same reference. */
@Injectable()
export class EstimateContext {
  constructor(private readonly slices: SlicesService) {}

  async of(
    sliceVersionId: string,
    referenceVersionId: string,
    longwave: boolean,
  ): Promise<EstimateDetail['context']> {
    const [slice, reference] = await Promise.all([
      this.slices.get(sliceVersionId),
      this.slices.get(referenceVersionId),
    ]);
    return {
      greenhouse: greenhouse(slice.content, reference.content),
      published: publishedMarks({ slice: slice.content, reference: reference.content, longwave }),
    };
  }
}

function greenhouse(slice: SliceContent, reference: SliceContent): EstimateDetail['context']['greenhouse'] {
  if (!slice.gases || !reference.gases) return null;
  const { co2Ppm, ch4Ppb, n2oPpb } = reference.gases;
  const answer = calculateGreenhouse({
    co2Ppm: slice.gases.co2Ppm,
    ch4Ppb: slice.gases.ch4Ppb,
    n2oPpb: slice.gases.n2oPpb,
    reference: { co2Ppm, ch4Ppb, n2oPpb },
    formula: 'meinshausen2020',
  });
  return { valueWm2: answer.totalWm2, formula: answer.method.name, source: answer.method.source };
}
