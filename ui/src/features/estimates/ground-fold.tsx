import { Select } from '@fluentui/react-components';
import type { BackdropView } from '@siltlight/common/wire/estimates';
import { FormField } from '../../shared/form/form-field';
import { formatNumber } from '../../shared/number/format';
import '../../shared/table/table.css';
import { NumberField } from './number-field';
import type { FoldProps } from './set-up-folds';

type Props = FoldProps & { backdrops: BackdropView[] };

const latitude = (deg: number) => (deg === 0 ? '0°' : `${Math.abs(deg)}° ${deg > 0 ? 'N' : 'S'}`);
const share = (value: number | null) => (value === null ? '–' : formatNumber(value, { decimals: 2 }));

/** Ground, cloud and the clearness of the air above the dust. */
export function GroundFold({ setUp, backdrops, problem, onChange }: Props) {
  const backdrop = backdrops.find((one) => one.versionId === setUp.backdrop);
  return (
    <>
      <div className="fold-grid">
        <FormField name="backdropVersionId" problem={problem} label="Surface albedo and cloud" required>
          <Select
            value={setUp.backdrop ?? ''}
            onChange={(_, data) => onChange({ backdrop: data.value || null })}
          >
            <option value="">Pick a table</option>
            {backdrops.map((one) => (
              <option
                key={one.versionId}
                value={one.versionId}
              >{`${one.title}, version ${one.number}`}</option>
            ))}
          </Select>
        </FormField>
        <NumberField
          name="transmittance"
          sentAs="transmittance"
          label="Transmittance above the dust, one way"
          hint="Enters squared. Starts at 0.76: Charlson et al. 1992, from memory."
          value={setUp.transmittance}
          disabled={setUp.method === 'efficiency'}
          problem={problem}
          onChange={(transmittance) => onChange({ transmittance })}
        />
      </div>
      {backdrop && (
        <>
          <div className="fold-scroll" tabIndex={0} role="region" aria-label={`Bands of ${backdrop.title}`}>
            <table className="sl-table fold-table">
              <thead>
                <tr>
                  <th scope="col">Latitudes</th>
                  <th scope="col" className="right">
                    Surface albedo
                  </th>
                  <th scope="col" className="right">
                    Cloud
                  </th>
                  <th scope="col" className="right">
                    over land
                  </th>
                  <th scope="col" className="right">
                    over sea
                  </th>
                </tr>
              </thead>
              <tbody>
                {[...backdrop.bands].reverse().map((band) => (
                  <tr key={band.southDeg}>
                    <td>
                      {latitude(band.southDeg)} to {latitude(band.northDeg)}
                    </td>
                    <td className="right">{share(band.surfaceAlbedo)}</td>
                    <td className="right">{share(band.cloudFraction)}</td>
                    <td className="right">{share(band.cloudFractionLand)}</td>
                    <td className="right">{share(band.cloudFractionOcean)}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
          <p className="sl-small sl-muted">
            Source: {backdrop.source}. {backdrop.note}
          </p>
        </>
      )}
    </>
  );
}
