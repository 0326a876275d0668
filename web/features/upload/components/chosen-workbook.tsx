import { useState } from 'react';
import { formatBytes } from '#shared/format/units';
import { limits } from '#shared/limits';
import { FieldErrorLine } from '../../../components/ui/field';
import { FileDrop } from '../../../components/ui/file-drop';
import { workbookEndings, workbookFileFault } from '../lib/workbook-file';

/** The place for the workbook. A file that cannot be read is refused here, and the one chosen before stays. */
export function ChosenWorkbook({
  file,
  onFile,
  isDisabled = false,
  missing = false,
}: {
  file: File | null;
  onFile: (file: File) => void;
  isDisabled?: boolean;
  /** True once sending was tried without one. */
  missing?: boolean;
}) {
  const [fault, setFault] = useState<string | null>(null);
  const choose = (chosen: File) => {
    const found = workbookFileFault(chosen, limits.workbookBytes);
    setFault(found);
    if (!found) onFile(chosen);
  };
  return (
    <>
      <FileDrop
        title={file ? file.name : 'Drop the workbook'}
        help={
          file
            ? `${formatBytes(file.size)}. Drop another to take its place.`
            : '.xlsx or .csv, in your laboratory’s own layout or the template. Your file is never changed.'
        }
        button={file ? 'Choose another' : 'Choose a file'}
        accept={workbookEndings}
        onFile={choose}
        isDisabled={isDisabled}
      />
      {fault ? <FieldErrorLine>{fault}</FieldErrorLine> : null}
      {missing && !file && !fault ? <FieldErrorLine>Choose the workbook to upload.</FieldErrorLine> : null}
    </>
  );
}
