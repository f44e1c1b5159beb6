import { useNavigate } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { useCreateCase } from '../../features/cases/api/create-case.ts';
import { CaseDetailsForm } from '../../features/cases/components/case-details-form.tsx';
import { SiteParcelPicker } from '../../features/places/components/site-parcel-picker.tsx';
import { paths } from '../paths.ts';

/** The first step of an application: its name and its site. */
export function NewApplicationPage() {
  const navigate = useNavigate();
  const createCase = useCreateCase();
  return (
    <div className="sheet-width grid gap-6 py-8">
      <div className="grid gap-2">
        <PageHeading>Start an application</PageHeading>
        <p className="measure">It is saved as a draft that only you see. The massing comes next.</p>
      </div>
      <CaseDetailsForm
        initial={{ title: '', description: '', siteParcels: [] }}
        submitLabel="Save and go on to the massing"
        isPending={createCase.isPending}
        error={createCase.error}
        onSubmit={(input) =>
          createCase.mutate(input, {
            onSuccess: ({ reference }) => void navigate(paths.application.href(reference)),
          })
        }
        renderParcels={(picked, onChange) => (
          <SiteParcelPicker picked={picked} onChange={onChange} />
        )}
      />
    </div>
  );
}
