import type { BackdropView, OpticalSetView } from '@siltlight/common/wire/estimates';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { Fragment } from 'react';
import { counted, formatNumber } from '../../shared/number/format';
import { sliceWithArticle, sliceWithin } from '../../shared/page/slice-name';
import { methodPhrases } from './method-words';
import type { SetUp } from './set-up';

/** A sentence in parts; what the person chose is set in bold. */
export type Sentence = readonly (string | { chosen: string })[];

const chosen = (text: string) => ({ chosen: text });

export const plainText = (sentence: Sentence) =>
  sentence.map((part) => (typeof part === 'string' ? part : part.chosen)).join('');

export const Say = ({ sentence }: { sentence: Sentence }) => (
  <>
    {sentence.map((part, at) => (
      <Fragment key={at}>{typeof part === 'string' ? part : <b>{part.chosen}</b>}</Fragment>
    ))}
  </>
);

export function airSentence(field: FieldDetail | undefined): Sentence {
  if (!field) return ['Pick the field whose air is to be computed.'];
  const { usedSites, regionsWithSites } = field.diagnostics;
  return [
    `Dust of ${sliceWithArticle(field.sliceName)} from `,
    chosen(field.title),
    ` (regional scaling, ${counted(usedSites, 'site')} in ${counted(regionsWithSites, 'region')}), against ${sliceWithin(field.referenceName)}; size fraction `,
    chosen(field.sizeCutoff ?? 'not stated'),
    '.',
  ];
}

export function opticsSentence(set: OpticalSetView | undefined, setUp: SetUp): Sentence {
  if (!set) return ['Pick the optical properties of the dust.'];
  const { low, central, high } = set.singleScatteringAlbedo;
  const text = (value: number) => formatNumber(value, { decimals: 3 });
  const longwave: Sentence = setUp.longwave
    ? [
        '; longwave ',
        chosen('on'),
        `, ${formatNumber(setUp.longwaveEfficiency, { figures: 3, signed: true })} W/m² per unit optical depth.`,
      ]
    : ['; longwave ', chosen('off'), '.'];
  return [
    'Optical set ',
    chosen(set.title),
    `, version ${set.number}; single-scattering albedo `,
    chosen(text(central)),
    ` (${text(low)} to ${text(high)})`,
    ...longwave,
  ];
}

export function groundSentence(backdrop: BackdropView | undefined, setUp: SetUp): Sentence {
  if (!backdrop) return ['Pick the table of surface albedo and cloud.'];
  const surface: Sentence = [
    'Surface albedo and cloud of both slices from ',
    chosen(backdrop.title),
    `, version ${backdrop.number}`,
  ];
  if (setUp.method === 'efficiency') return [...surface, '; this method does not use the transmittance.'];
  return [
    ...surface,
    '; transmittance of the air above the dust ',
    chosen(formatNumber(setUp.transmittance, { decimals: 2 })),
    '.',
  ];
}

export const methodSentence = (setUp: SetUp): Sentence => [
  chosen(methodPhrases[setUp.method].name),
  `, ${methodPhrases[setUp.method].does}; `,
  chosen(`${setUp.members} members`),
  ', seed ',
  chosen(String(setUp.seed)),
  '.',
];
