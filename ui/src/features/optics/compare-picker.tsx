import { Dropdown, Option } from '@fluentui/react-components';
import { useQuery } from '@tanstack/react-query';
import { listedSetsQuery } from './queries';

type Props = { own: string | null; chosen: readonly string[]; onChange: (slugs: string[]) => void };

export const MAX_BESIDE = 4;

/** Published sets to draw beside the one at work. */
export function ComparePicker({ own, chosen, onChange }: Props) {
  const { data: sets = [] } = useQuery(listedSetsQuery('published'));
  const names = chosen.map((slug) => sets.find((set) => set.slug === slug)?.title ?? slug);
  return (
    <Dropdown
      multiselect
      className="optics-compare"
      aria-label="Compare with"
      placeholder="Compare with"
      value={names.length === 0 ? '' : names.length === 1 ? names[0] : `${names.length} sets beside it`}
      selectedOptions={[...chosen]}
      onOptionSelect={(_, data) => onChange(data.selectedOptions.slice(-MAX_BESIDE))}
    >
      {sets
        .filter((set) => set.slug !== own)
        .map((set) => (
          <Option key={set.slug} value={set.slug}>
            {set.title}
          </Option>
        ))}
    </Dropdown>
  );
}
