import { Button } from '@fluentui/react-components';
import { ArrowUpload20Regular } from '@fluentui/react-icons';
import { useRef, useState, type DragEvent, type ReactNode } from 'react';
import '../feedback/feedback.css';

type Props = {
  label: string;
  /** File name endings, as `.xlsx,.csv`. */
  accept?: string;
  multiple?: boolean;
  disabled?: boolean;
  onFiles: (files: File[]) => void;
  children?: ReactNode;
};

/** A place to drop files, with a button that does the same for the keyboard. */
export function FileDrop({ label, accept, multiple, disabled, onFiles, children }: Props) {
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const take = (list: FileList | null) => {
    const files = [...(list ?? [])];
    if (files.length > 0 && !disabled) onFiles(multiple ? files : files.slice(0, 1));
  };
  const drag = (isOver: boolean) => (event: DragEvent) => {
    event.preventDefault();
    setOver(isOver && !disabled);
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    take(event.dataTransfer.files);
  };
  return (
    <div
      className={over ? 'file-drop over' : 'file-drop'}
      onDragOver={drag(true)}
      onDragLeave={drag(false)}
      onDrop={drop}
    >
      {children}
      <Button
        appearance="primary"
        icon={<ArrowUpload20Regular />}
        disabled={disabled}
        onClick={() => input.current?.click()}
      >
        {label}
      </Button>
      <input
        ref={input}
        type="file"
        hidden
        aria-label={label}
        accept={accept}
        multiple={multiple}
        onChange={(event) => {
          take(event.target.files);
          event.target.value = '';
        }}
      />
    </div>
  );
}
