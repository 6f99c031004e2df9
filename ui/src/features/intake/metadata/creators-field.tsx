import { Button, Input } from '@fluentui/react-components';
import { Add16Regular, ArrowUp16Regular, Dismiss16Regular } from '@fluentui/react-icons';
import type { MetadataField } from '@siltlight/common/dataset/metadata-form';
import { FormField } from '../../../shared/form/form-field';
import type { Creator } from './check-metadata';
import type { MetadataDraft } from './use-metadata-draft';

const nobody: Creator = { name: '' };

/** The people of the citation, in its order. */
export function CreatorsField({ question, draft }: { question: MetadataField; draft: MetadataDraft }) {
  const creators = draft.metadata.creators?.length ? draft.metadata.creators : [nobody];
  const set = (next: Creator[]) => draft.edit({ creators: next });
  const change = (at: number, part: Partial<Creator>) =>
    set(creators.map((one, index) => (index === at ? { ...one, ...part } : one)));
  return (
    <fieldset className="creators" data-field={question.field}>
      <legend>
        {question.label}
        <span className="required-sign" aria-hidden="true">
          *
        </span>
      </legend>
      <p className="sl-small sl-muted">{question.help}</p>
      {creators.map((creator, at) => (
        <div key={at} className="creator">
          <FormField
            name={`creators.${at}.name`}
            label={`Name ${at + 1}`}
            fault={draft.faults[`creators.${at}.name`]}
          >
            <Input
              size="small"
              value={creator.name}
              maxLength={300}
              onChange={(_, data) => change(at, { name: data.value })}
            />
          </FormField>
          <FormField
            name={`creators.${at}.orcid`}
            label="ORCID iD"
            fault={draft.faults[`creators.${at}.orcid`]}
          >
            <Input
              size="small"
              value={creator.orcid ?? ''}
              placeholder="0000-0000-0000-0000"
              onChange={(_, data) => change(at, { orcid: data.value })}
            />
          </FormField>
          <FormField name={`creators.${at}.affiliation`} label="Affiliation">
            <Input
              size="small"
              value={creator.affiliation ?? ''}
              maxLength={300}
              onChange={(_, data) => change(at, { affiliation: data.value })}
            />
          </FormField>
          <span className="creator-acts">
            <Button
              size="small"
              appearance="subtle"
              icon={<ArrowUp16Regular />}
              aria-label={`Move ${creator.name || `creator ${at + 1}`} up`}
              disabled={at === 0}
              onClick={() =>
                set([...creators.slice(0, at - 1), creator, creators[at - 1]!, ...creators.slice(at + 1)])
              }
            />
            <Button
              size="small"
              appearance="subtle"
              icon={<Dismiss16Regular />}
              aria-label={`Remove ${creator.name || `creator ${at + 1}`}`}
              disabled={creators.length === 1 && !creator.name}
              onClick={() => set(creators.filter((_, index) => index !== at))}
            />
          </span>
        </div>
      ))}
      <Button size="small" icon={<Add16Regular />} onClick={() => set([...creators, nobody])}>
        Add a creator
      </Button>
    </fieldset>
  );
}
