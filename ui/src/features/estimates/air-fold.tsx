import { Select } from '@fluentui/react-components';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { FormField } from '../../shared/form/form-field';
import { counted } from '../../shared/number/format';
import { formatDate } from '../../shared/number/time';
import type { FoldProps } from './set-up-folds';

type Props = FoldProps & { fields: FieldDetail[] };

/** Which field the air comes from. */
export function AirFold({ setUp, fields, problem, onChange }: Props) {
  const field = fields.find((one) => one.versionId === setUp.field);
  if (fields.length === 0) {
    return (
      <p className="sl-13">
        No field is built yet. <Link to="/slices">Pick a slice</Link> and build one from the dataset versions
        in force.
      </p>
    );
  }
  return (
    <>
      <FormField name="fieldVersionId" problem={problem} label="Field" required>
        <Select value={setUp.field ?? ''} onChange={(_, data) => onChange({ field: data.value || null })}>
          <option value="">Pick a field</option>
          {fields.map((one) => (
            <option key={one.versionId} value={one.versionId}>
              {`${one.title}, ${counted(one.diagnostics.usedSites, 'site')}, ${formatDate(one.createdAt)}${one.stale ? ' (inputs superseded)' : ''}`}
            </option>
          ))}
        </Select>
      </FormField>
      {field && (
        <p className="sl-13 sl-second">
          <Link to={`/fields/${field.versionId}`}>Look at the field</Link>: its regions, sites and pins.
          {field.stale && ` ${field.staleReason ?? 'One of its dataset versions has been superseded.'}`}
        </p>
      )}
    </>
  );
}
