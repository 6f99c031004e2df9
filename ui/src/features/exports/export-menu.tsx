import { Button, Menu, MenuItem, MenuList, MenuPopover, MenuTrigger } from '@fluentui/react-components';
import { ArrowDownload20Regular } from '@fluentui/react-icons';
import type { ExportFormat } from '@siltlight/common/wire/exports';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { useSay } from '../../shared/feedback/toasts';
import { exportFormats, requestExport } from './queries';

type Props = { estimateId: string; primary: boolean };

/** Asks for a file of an estimate; it is made as a job and kept with its checksum. */
export function ExportMenu({ estimateId, primary }: Props) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const say = useSay();
  const ask = useMutation({
    mutationFn: (format: ExportFormat) => requestExport(estimateId, format),
    onSuccess: async ({ id }) => {
      await client.invalidateQueries({ queryKey: ['jobs'] });
      await client.invalidateQueries({ queryKey: ['exports'] });
      await navigate(`/exports?file=${id}`);
    },
    onError: (error) => say('The export was not started', error.message, 'error'),
  });
  return (
    <Menu>
      <MenuTrigger disableButtonEnhancement>
        <Button
          appearance={primary ? 'primary' : 'secondary'}
          icon={<ArrowDownload20Regular />}
          disabled={ask.isPending}
        >
          Export
        </Button>
      </MenuTrigger>
      <MenuPopover>
        <MenuList>
          {(Object.keys(exportFormats) as ExportFormat[]).map((format) => (
            <MenuItem key={format} subText={exportFormats[format].says} onClick={() => ask.mutate(format)}>
              {exportFormats[format].name}
            </MenuItem>
          ))}
        </MenuList>
      </MenuPopover>
    </Menu>
  );
}
