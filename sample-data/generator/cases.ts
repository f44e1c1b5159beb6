import { proposalsByCase, type CaseKey } from './case-massings.ts';
import { caseTexts } from './case-texts.ts';
import type { City } from './city.ts';
import type { Massing } from './massing.ts';
import { toLngLat } from './plane.ts';
import { centroidOf } from './shape.ts';

/** A case of the demo as `cases.json` has it. */
export interface SampleCase {
  key: CaseKey;
  title: string;
  description: string;
  /** The address of the first site parcel. */
  address: string;
  siteParcels: string[];
  applicant: string;
  state: string;
  /** In the order of the revisions; paths within `sample-data/`. */
  massings: { file: string; sentBackReason: string | null }[];
  comments: { author: string; text: string; pin: [number, number] | null }[];
}

const caseKeys = Object.keys(caseTexts).filter((key): key is CaseKey => key in proposalsByCase);

/** Where the pin of somebody at this address stands. */
function pinAt(city: City, address: string): [number, number] {
  const parcel = city.parcels.find((one) => one.address === address);
  if (!parcel) throw new Error(`There is no parcel at ${address}.`);
  return toLngLat(centroidOf(parcel.shape));
}

/** The cases, and the massings that they speak of. */
export function writeCases(city: City): { cases: SampleCase[]; massings: Massing[] } {
  const massings: Massing[] = [];
  const cases = caseKeys.map((key): SampleCase => {
    const { title, description, applicant, state, sentBackReasons, comments } = caseTexts[key];
    const proposal = proposalsByCase[key](city);
    massings.push(...proposal.massings);
    return {
      key,
      title,
      description,
      address: proposal.site.parcels[0]?.address ?? '',
      siteParcels: proposal.site.parcels.map(({ number }) => number),
      applicant,
      state,
      massings: proposal.massings.map(({ fileName }, index) => ({
        file: `massings/${fileName}`,
        sentBackReason: sentBackReasons[index] ?? null,
      })),
      comments: comments.map(({ author, address, text }) => ({
        author,
        text,
        pin: address === null ? null : pinAt(city, address),
      })),
    };
  });
  return { cases, massings };
}
