import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { type MappingInput, mappingSchema } from '#rules/reading/mapping';
import { Button } from '../../../components/ui/button';
import { FieldErrorLine } from '../../../components/ui/field';
import { FileDrop } from '../../../components/ui/file-drop';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RichText } from '../../../components/ui/rich-text';
import { SectionHead } from '../../../components/ui/section-head';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useLaboratories } from '../../../lib/queries/laboratories-query';
import { importPreviewQuery, type MappingImport, useImportMapping } from '../api/mappings';

interface Chosen {
  fileName: string;
  document: MappingInput;
}

/** A mapping that was exported elsewhere: what it would change is shown before it is kept. */
export function ImportMapping() {
  const { laboratories } = useLaboratories();
  const [chosen, setChosen] = useState<Chosen | null>(null);
  const [faults, setFaults] = useState<string[]>([]);
  const [name, setName] = useState('');
  const [laboratoryId, setLaboratoryId] = useState(laboratories[0]?.id ?? null);
  const choose = async (file: File) => {
    const read = await readMapping(file);
    setFaults(read.faults);
    setChosen(read.document ? { fileName: file.name, document: read.document } : null);
    if (read.document && name === '') setName(read.document.laboratory);
  };
  const leave = () => {
    setChosen(null);
    setFaults([]);
  };
  if (laboratories.length === 0) return null;
  return (
    <section>
      <SectionHead title="Import a mapping" />
      <div className="form-column">
        <FileDrop
          title={chosen ? chosen.fileName : 'Drop an exported mapping'}
          help="A document of the format clauseway/mapping@1."
          button="Choose a file"
          accept={['.json', 'application/json']}
          onFile={(file) => void choose(file)}
        />
        {faults.map((fault) => (
          <FieldErrorLine key={fault}>{fault}</FieldErrorLine>
        ))}
        {chosen ? (
          <>
            <SelectField
              label="Laboratory"
              choices={laboratories.map(({ id, name: of }) => ({ value: id, label: of }))}
              value={laboratoryId}
              onChange={setLaboratoryId}
            />
            <TextField
              label="Name"
              value={name}
              onChange={setName}
              error={name.trim() === '' ? 'Give a name.' : undefined}
            />
            {laboratoryId !== null && name.trim() !== '' ? (
              <ImportPreview
                given={{ laboratoryId, name: name.trim(), document: chosen.document }}
                onLeave={leave}
              />
            ) : null}
          </>
        ) : null}
      </div>
    </section>
  );
}

function ImportPreview({ given, onLeave }: { given: MappingImport; onLeave: () => void }) {
  const preview = useQuery(importPreviewQuery(given));
  const keep = useImportMapping();
  const navigate = useNavigate();
  const problem = keep.error ?? preview.error;
  const take = () =>
    keep.mutate(given, {
      onSuccess: ({ id, name, number }) => {
        announce(`Version ${number} of ${name} is imported.`);
        void navigate(paths.mapping(id));
      },
    });
  return (
    <div className="pt-2">
      {problem ? <ProblemNotice problem={asProblem(problem)} unaffected="Nothing was imported." /> : null}
      <div aria-live="polite">
        {preview.data ? (
          <>
            <p>{preview.data.text}</p>
            <Sentences title="It would add" sentences={preview.data.added} />
            <Sentences title="It would take away" sentences={preview.data.removed} />
          </>
        ) : problem ? null : (
          <p className="mute">Working out what it would change.</p>
        )}
      </div>
      <div className="acts py-2">
        <Button onPress={take} isDisabled={!preview.data} isPending={keep.isPending}>
          Import it
        </Button>
        <Button kind="text" onPress={onLeave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

function Sentences({ title, sentences }: { title: string; sentences: readonly string[] }) {
  if (sentences.length === 0) return null;
  return (
    <>
      <h3 className="pt-2">{title}</h3>
      <ul className="ruled-lines">
        {sentences.map((sentence) => (
          <li key={sentence}>
            <RichText>{sentence}</RichText>
          </li>
        ))}
      </ul>
    </>
  );
}

/** Every fault of the document at once, each with its place. */
async function readMapping(file: File): Promise<{ document: MappingInput | null; faults: string[] }> {
  let value: unknown;
  try {
    value = JSON.parse(await file.text());
  } catch {
    return {
      document: null,
      faults: [`${file.name} is not a mapping document. Choose one that was exported.`],
    };
  }
  const parsed = mappingSchema.safeParse(value);
  if (parsed.success) return { document: parsed.data, faults: [] };
  return {
    document: null,
    faults: parsed.error.issues
      .slice(0, 8)
      .map(
        ({ path, message }) => `${file.name}, ${path.length > 0 ? path.join('/') : 'at its top'}: ${message}`,
      ),
  };
}
