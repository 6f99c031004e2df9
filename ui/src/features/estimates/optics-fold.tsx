import { Select, Switch } from '@fluentui/react-components';
import type { OpticalSetView } from '@siltlight/common/wire/estimates';
import type { ReactNode } from 'react';
import { FormField } from '../../shared/form/form-field';
import { formatNumber } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import '../../shared/table/table.css';
import { NumberField } from './number-field';
import type { FoldProps } from './set-up-folds';

type Props = FoldProps & { sets: OpticalSetView[] };

/** Optical set with its intervals and source, and whether longwave counts. */
export function OpticsFold({ setUp, sets, problem, onChange }: Props) {
  const set = sets.find((one) => one.versionId === setUp.optics);
  return (
    <>
      <FormField name="opticalSetVersionId" problem={problem} label="Optical set" required>
        <Select value={setUp.optics ?? ''} onChange={(_, data) => onChange({ optics: data.value || null })}>
          <option value="">Pick an optical set</option>
          {sets.map((one) => (
            <option key={one.versionId} value={one.versionId}>{`${one.title}, version ${one.number}`}</option>
          ))}
        </Select>
      </FormField>
      {set && <OpticsTable set={set} />}
      <div className="fold-grid">
        <Switch
          checked={setUp.longwave}
          label="Longwave on"
          onChange={(_, data) => onChange({ longwave: data.checked })}
        />
        <NumberField
          name="longwaveEfficiency"
          sentAs="longwave.efficiencyWm2"
          label={
            <>
              Longwave efficiency, <Unit of="W m-2" /> per unit optical depth
            </>
          }
          hint="Starts at +8: implied by Kok et al. 2023, from memory."
          value={setUp.longwaveEfficiency}
          disabled={!setUp.longwave}
          problem={problem}
          onChange={(longwaveEfficiency) => onChange({ longwaveEfficiency })}
        />
      </div>
    </>
  );
}

function OpticsTable({ set }: { set: OpticalSetView }) {
  const wavelength = `${formatNumber(set.wavelengthUm * 1000, { decimals: 0 })} nm`;
  const rows: [ReactNode, OpticalSetView['asymmetry'], number][] = [
    ['Single-scattering albedo', set.singleScatteringAlbedo, 3],
    ['Asymmetry parameter', set.asymmetry, 2],
    [
      <>
        Mass extinction, <Unit of="m2 g-1" />
      </>,
      set.massExtinctionM2PerG,
      2,
    ],
  ];
  return (
    <>
      <table className="sl-table fold-table" aria-label={`Values of ${set.title}`}>
        <thead>
          <tr>
            <th scope="col">Parameter at {wavelength}</th>
            <th scope="col" className="right">
              Low
            </th>
            <th scope="col" className="right">
              Middle
            </th>
            <th scope="col" className="right">
              High
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(([name, { low, central, high }, decimals], at) => (
            <tr key={at}>
              <td>{name}</td>
              <td className="right">{formatNumber(low, { decimals })}</td>
              <td className="right">
                <b>{formatNumber(central, { decimals })}</b>
              </td>
              <td className="right">{formatNumber(high, { decimals })}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="sl-small sl-muted">
        Particles {set.sizeCutoff}. Source: {set.source}. Evidence: {set.evidence}. {set.note}
      </p>
    </>
  );
}
