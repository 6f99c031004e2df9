import type { FieldDetail } from '@siltlight/common/wire/slices';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { Amount } from '../../shared/number/amount';
import { formatNumber } from '../../shared/number/format';
import { sliceWithArticle } from '../../shared/page/slice-name';
import { FieldMap } from './field-map';
import { FieldRegionTable, UnusedSites, UsedSites } from './field-tables';
import { filledInWords, spreadInWords } from './field-words';
import './fields.css';

/** A field, kept or not: what it says, how far to trust it, by region and by site. */
export function FieldReport({ field }: { field: FieldDetail }) {
  const [params, setParams] = useSearchParams();
  const [hovered, setHovered] = useState<string | null>(null);
  const selected = params.get('region');
  const select = (code: string | null) =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        if (code && code !== before.get('region')) next.set('region', code);
        else next.delete('region');
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  const step = { selected, onSelect: select, onHover: setHovered };
  return (
    <div className="field-report">
      <FieldHeadline field={field} />
      <div className="field-pair">
        <FieldMap field={field} hovered={hovered} {...step} />
        <FieldRegionTable regions={field.regions} {...step} />
      </div>
      <div className="field-sites">
        <UsedSites field={field} />
        <UnusedSites field={field} />
      </div>
    </div>
  );
}

function FieldHeadline({ field }: { field: FieldDetail }) {
  const { diagnostics } = field;
  return (
    <div className="field-headline">
      <div>
        <p className="field-say">
          Over the sites used, dust deposition in {sliceWithArticle(field.sliceName)} was{' '}
          <Amount of={diagnostics.globalRatio} signed={false} fallback={1} /> times that of{' '}
          {sliceWithArticle(field.referenceName)}.
        </p>
        <ExplainedCautions of={field.cautions} first={3} />
      </div>
      <div className="field-trust">
        <p>{spreadInWords(diagnostics)}</p>
        <p>{filledInWords(diagnostics)}</p>
        <p>
          Optical depth at 550 nm, global mean:{' '}
          <b>{formatNumber(field.globalOpticalDepthSlice, { figures: 2 })}</b> against{' '}
          <b>{formatNumber(field.globalOpticalDepthReference, { figures: 2 })}</b>. Base field:{' '}
          {field.baseField.title}.
        </p>
      </div>
    </div>
  );
}
