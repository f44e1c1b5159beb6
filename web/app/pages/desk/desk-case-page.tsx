import { Outlet, useOutletContext, useParams } from 'react-router-dom';
import { caseStateWords } from '../../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { NavLinks } from '../../../components/nav-links.tsx';
import { PageHeading } from '../../../components/page-heading.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { TitleStrip } from '../../../components/title-strip.tsx';
import { useCase } from '../../../features/cases/api/get-case.ts';
import { CaseFinding } from '../../../features/cases/components/case-finding.tsx';
import { deskParts, type DeskPart } from '../../../features/cases/next-step.ts';
import { describeProposal } from '../../../features/cases/proposal-in-words.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { paths } from '../../paths.ts';

const partLabels = {
  intake: 'Intake',
  study: 'Study',
  findings: 'Findings',
  comments: 'Comments',
  report: 'Report',
  log: 'Log',
} as const satisfies Record<DeskPart, string>;

/** One case on the desk: its facts at the head, its parts below. */
export function DeskCasePage() {
  const { reference = '' } = useParams();
  const reviewCase = useCase(reference);
  return (
    <QueryView query={reviewCase} what="the case">
      {(detail) => <DeskCase reviewCase={detail} />}
    </QueryView>
  );
}

function DeskCase({ reviewCase }: { reviewCase: CaseDetail }) {
  const formats = useFormats();
  const { reference, latestStudy } = reviewCase;
  return (
    <div className="sheet-width grid gap-6 pt-5 pb-8">
      <div>
        <div className="flex flex-wrap items-baseline justify-between gap-x-8 gap-y-2">
          <PageHeading className="text-heading">{reviewCase.title}</PageHeading>
          <NavLinks
            label="Parts of the case"
            links={visibleParts(reviewCase).map((part) => ({
              to: paths.deskCase.href(reference, part),
              label: partLabels[part],
            }))}
          />
        </div>
        <TitleStrip
          entries={[
            { label: 'Case', value: reference },
            { label: 'Site', value: reviewCase.address },
            {
              label: 'Proposal',
              value:
                reviewCase.latestRevision === null
                  ? 'no massing yet'
                  : `${describeProposal(reviewCase, formats)}, revision ${reviewCase.latestRevision}`,
            },
            {
              label: 'State',
              value: `${caseStateWords[reviewCase.state]} since ${formats.shortDateOfInstant(reviewCase.stateSince)}`,
            },
            {
              label: 'Finding',
              value: (
                <>
                  <CaseFinding study={latestStudy} />
                  {latestStudy === null || latestStudy.lossIndex === null
                    ? ''
                    : `, loss index ${formats.number(latestStudy.lossIndex, 1)}`}
                </>
              ),
            },
          ]}
        />
      </div>
      <Outlet context={reviewCase} />
    </div>
  );
}

/** The case that the desk's layout has loaded, for its parts. */
export function useDeskCase(): CaseDetail {
  return useOutletContext<CaseDetail>();
}

/** Comments and reports come up with the abilities that belong to them; the rest is open to all who see the case. */
function visibleParts({ abilities }: CaseDetail): DeskPart[] {
  return deskParts.filter((part) => {
    if (part === 'study' || part === 'findings') return abilities.includes('read-study');
    if (part === 'report') return abilities.includes('read-report');
    return true;
  });
}
