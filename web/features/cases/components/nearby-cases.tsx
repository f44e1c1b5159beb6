import { Link } from 'react-router-dom';
import type { Parcel } from '../../../../shared/contracts/base-data.ts';
import type { CaseSummary } from '../../../../shared/contracts/cases.ts';
import { paths } from '../../../app/paths.ts';
import { approximateDistanceM, boxMiddle } from '../../../lib/distance.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface NearbyCasesProps {
  parcels: readonly Parcel[];
  cases: readonly CaseSummary[];
}

const shownCases = 3;

/** For an address that somebody searched: the nearest open cases, and what each changes there. */
export function NearbyCases({ parcels, cases }: NearbyCasesProps) {
  const formats = useFormats();
  return (
    <ul className="border-t border-hairline">
      {parcels.map((parcel) => (
        <li key={parcel.number} className="border-b border-hairline py-3">
          <p>
            <span className="font-strong">{parcel.address}</span>{' '}
            <span className="text-small text-ink-soft">parcel {parcel.number}</span>
          </p>
          <ul className="text-small">
            {nearestCases(parcel, cases).map(({ reviewCase, distanceM }) => (
              <li key={reviewCase.reference}>
                <Link
                  to={paths.publicCase.href(reviewCase.reference, { receptor: parcel.number })}
                  className="link"
                >
                  {reviewCase.title}: what changes here
                </Link>
                , about {formats.number(Math.round(distanceM / 10) * 10)}&nbsp;m away
              </li>
            ))}
          </ul>
        </li>
      ))}
    </ul>
  );
}

function nearestCases(parcel: Parcel, cases: readonly CaseSummary[]) {
  const middle = boxMiddle(parcel.geometry);
  return cases
    .flatMap((reviewCase) =>
      reviewCase.sitePoint === null
        ? []
        : [{ reviewCase, distanceM: approximateDistanceM(middle, reviewCase.sitePoint) }],
    )
    .toSorted((one, other) => one.distanceM - other.distanceM)
    .slice(0, shownCases);
}
