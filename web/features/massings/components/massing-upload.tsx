import { useRef, useState, type ReactNode } from 'react';
import type { MassingSite } from '../../../../shared/massing/massing-scene.ts';
import { Button } from '../../../components/button.tsx';
import { FileDrop } from '../../../components/file-drop.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useToast } from '../../../components/toast.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { useCreateMassing } from '../api/create-massing.ts';
import { readMassingFile, type MassingFileReading } from '../read-massing-file.ts';

export interface MassingUploadProps {
  reference: string;
  site: MassingSite;
  /** The number that the file becomes when it is sent. */
  nextRevision: number;
  renderReview: (reading: MassingFileReading) => ReactNode;
}

const acceptedFileTypes = ['.geojson', '.json', 'application/geo+json'];

type UploadState =
  | { step: 'choose' }
  | { step: 'reading'; fileName: string }
  | { step: 'review'; reading: MassingFileReading; idempotencyKey: string }
  | { step: 'failed'; error: unknown };

/** A massing file: read and checked here first, sent only when the applicant says so. */
export function MassingUpload({ reference, site, nextRevision, renderReview }: MassingUploadProps) {
  const formats = useFormats();
  const showToast = useToast();
  const createMassing = useCreateMassing(reference);
  const [state, setState] = useState<UploadState>({ step: 'choose' });
  const reviewHeading = useRef<HTMLHeadingElement>(null);

  const handleFile = async (file: File) => {
    setState({ step: 'reading', fileName: file.name });
    createMassing.reset();
    try {
      const reading = await readMassingFile(file, site);
      setState({ step: 'review', reading, idempotencyKey: crypto.randomUUID() });
      requestAnimationFrame(() => reviewHeading.current?.focus());
    } catch (error) {
      setState({ step: 'failed', error });
    }
  };

  if (state.step === 'review') {
    const { reading, idempotencyKey } = state;
    const { file } = reading;
    return (
      <div className="grid gap-5">
        <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
          <h3 ref={reviewHeading} tabIndex={-1}>
            How {file.name} was read
          </h3>
          <span className="text-small text-ink-soft">
            {formats.fileSize(file.size)} · nothing is sent yet
          </span>
        </div>
        {renderReview(reading)}
        {reading.isSound ? null : (
          <p className="measure say">
            It cannot be sent like this. Put right what is marked “must be corrected” and choose the
            file again.
          </p>
        )}
        {createMassing.isError ? <ProblemNotice error={createMassing.error} /> : null}
        <div className="flex flex-wrap gap-3">
          {reading.isSound ? (
            <Button
              kind="primary"
              isPending={createMassing.isPending}
              onPress={() =>
                createMassing.mutate(
                  { file, idempotencyKey },
                  {
                    onSuccess: ({ revision }) => {
                      setState({ step: 'choose' });
                      showToast(`Revision ${revision} is stored.`);
                    },
                  },
                )
              }
            >
              Send it as revision {nextRevision}
            </Button>
          ) : null}
          <Button onPress={() => setState({ step: 'choose' })}>Choose another file</Button>
        </div>
      </div>
    );
  }

  return (
    <div className="measure grid gap-3">
      <FileDrop
        label="the massing"
        acceptedFileTypes={acceptedFileTypes}
        onFile={(file) => void handleFile(file)}
      >
        <p className="text-small text-ink-soft">
          GeoJSON on WGS 84: one polygon for each block, base and top in metres. It is read on your
          own computer first.
        </p>
      </FileDrop>
      <div role="status">{state.step === 'reading' ? <p>Reading {state.fileName} …</p> : null}</div>
      {state.step === 'failed' ? <ProblemNotice error={state.error} /> : null}
    </div>
  );
}
