import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  Input,
  ProgressBar,
  Select,
} from '@fluentui/react-components';
import { DocumentTable20Regular } from '@fluentui/react-icons';
import { DATASET_KINDS } from '@siltlight/common/dataset/kinds';
import { useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { ErrorState } from '../../../shared/feedback/error-state';
import { FileDrop } from '../../../shared/form/file-drop';
import { FormField } from '../../../shared/form/form-field';
import { submitOnCtrlEnter } from '../../../shared/form/submit-keys';
import { formatBytes, formatPercent } from '../../../shared/number/format';
import { listKey, submissionQuery, templateAddress } from '../queries';
import { useUpload } from './use-upload';

export const ACCEPTED = '.xlsx,.xlsm,.xlsb,.xls,.ods,.csv,.tsv,.txt';

type Props = { file: File | null; onFile: (file: File) => void; onClose: () => void };

/** Which file, what it holds, and off it goes; a refusal keeps the file and says how to mend it. */
export function UploadDialog({ file, onFile, onClose }: Props) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const [kind, setKind] = useState<string>(DATASET_KINDS[0]!.id);
  const [title, setTitle] = useState('');
  const { send, cancel, progress01, problem, busy, forget } = useUpload(async (detail) => {
    client.setQueryData(submissionQuery(detail.id).queryKey, detail);
    await client.invalidateQueries({ queryKey: listKey });
    await navigate(`/intake/${detail.id}`);
  });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (file && !busy) send({ file, kind, title });
  };
  const take = (next: File) => {
    forget();
    onFile(next);
  };
  const close = () => {
    cancel();
    onClose();
  };
  return (
    <Dialog open modalType="modal" onOpenChange={(_, data) => !data.open && close()}>
      <DialogSurface aria-label="Upload a spreadsheet">
        <form onSubmit={submit} onKeyDown={submitOnCtrlEnter}>
          <DialogBody>
            <DialogTitle>Upload a spreadsheet</DialogTitle>
            <DialogContent className="upload">
              {problem && (
                <ErrorState
                  error={problem}
                  kept="The file is still chosen; nothing was stored."
                  fields={['title']}
                />
              )}
              <FileDrop
                label={file ? 'Choose another file' : 'Choose a file'}
                accept={ACCEPTED}
                disabled={busy}
                onFiles={([first]) => first && take(first)}
              >
                {file ? <ChosenFile file={file} /> : <p>Drop a workbook or a text table here.</p>}
              </FileDrop>
              <FormField name="kind" label="What it holds">
                <Select value={kind} disabled={busy} onChange={(_, data) => setKind(data.value)}>
                  {DATASET_KINDS.map(({ id, title: name }) => (
                    <option key={id} value={id}>
                      {name}
                    </option>
                  ))}
                </Select>
              </FormField>
              <FormField name="title" label="Title" hint="May wait: the form asks again." problem={problem}>
                <Input
                  value={title}
                  disabled={busy}
                  maxLength={300}
                  onChange={(_, data) => setTitle(data.value)}
                />
              </FormField>
              {busy && <Progress progress01={progress01} />}
              <p className="sl-small sl-muted">
                XLSX, XLSM, XLSB, XLS, ODS, CSV, TSV or TXT; macros never run. The file is kept as it is. No
                table yet? <a href={templateAddress(kind)}>Take the template</a>.
              </p>
            </DialogContent>
            <DialogActions>
              <Button onClick={close}>{busy ? 'Stop the upload' : 'Close'}</Button>
              <Button type="submit" appearance="primary" disabled={!file || busy}>
                {problem ? 'Try again' : 'Upload'}
              </Button>
            </DialogActions>
          </DialogBody>
        </form>
      </DialogSurface>
    </Dialog>
  );
}

const ChosenFile = ({ file }: { file: File }) => (
  <p className="upload-file">
    <DocumentTable20Regular aria-hidden />
    <b>{file.name}</b>
    <span className="sl-muted">{formatBytes(file.size)}</span>
  </p>
);

function Progress({ progress01 }: { progress01: number }) {
  const reading = progress01 >= 1;
  return (
    <div role="status">
      <ProgressBar value={reading ? undefined : progress01} thickness="large" aria-label="Upload" />
      <p className="sl-small sl-muted">
        {reading
          ? 'Arrived. The sheets are read, mapped and vetted …'
          : `Sending, ${formatPercent(progress01)}`}
      </p>
    </div>
  );
}
