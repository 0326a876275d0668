import type { ReactNode } from 'react';
import { Button as AriaButton, DropZone, FileTrigger, Text } from 'react-aria-components';
import { classOf } from './button';
import { Kbd } from './kbd';

/** A dashed place for one file: dropped, chosen, or pasted. What is wrong with a file the caller says. */
export function FileDrop({
  title,
  help,
  button,
  keyHint,
  accept,
  onFile,
  isDisabled = false,
}: {
  /** "Drop a workbook to check it" */
  title: string;
  help: ReactNode;
  /** "Choose a file" */
  button: string;
  keyHint?: string;
  /** Endings and media types, `.xlsx`. */
  accept: readonly string[];
  onFile: (file: File) => void;
  isDisabled?: boolean;
}) {
  return (
    <DropZone
      className="drop"
      isDisabled={isDisabled}
      onDrop={async (event) => {
        const first = event.items.find((item) => item.kind === 'file');
        if (first?.kind === 'file') onFile(await first.getFile());
      }}
    >
      <Text slot="label">
        <b>{title}</b>
      </Text>
      <span className="mute condensed">{help}</span>
      <FileTrigger
        acceptedFileTypes={accept}
        onSelect={(files) => {
          const file = files?.[0];
          if (file) onFile(file);
        }}
      >
        <AriaButton className={classOf('outlined')} isDisabled={isDisabled}>
          {button}
          {keyHint ? <Kbd hidden>{keyHint}</Kbd> : null}
        </AriaButton>
      </FileTrigger>
    </DropZone>
  );
}
