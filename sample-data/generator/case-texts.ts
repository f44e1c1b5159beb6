import type { CaseKey } from './case-massings.ts';

/** What people wrote about a case, all of it invented. */
export interface CaseText {
  title: string;
  description: string;
  applicant: string;
  /** The state that the demo brings the case to, by its name in the life of a case. */
  state: 'draft' | 'submitted' | 'under-review' | 'open-for-comment' | 'report-issued' | 'approved';
  /** Why an earlier revision was sent back, one reason for each revision but the last. */
  sentBackReasons: readonly string[];
  comments: readonly {
    author: string;
    /** The author's address, where the pin of the comment stands; null for a comment without a pin. */
    address: string | null;
    text: string;
  }[];
}

export const caseTexts: Record<CaseKey, CaseText> = {
  'tallow-wharf-lofts': {
    title: 'Tallow Wharf Lofts',
    description:
      'A tower of 14 storeys, 44.0 m high, on a podium of 14.0 m along the street, with 96 apartments and workshops at the water. Two sheds of the old wharf are removed. The quay in front of the building stays open to the public.',
    applicant: 'Ilse Vantwistle',
    state: 'under-review',
    sentBackReasons: [],
    comments: [],
  },
  'netloft-corner': {
    title: 'Three homes at Netloft Street',
    description:
      'A house of three storeys and 9.6 m with one home on each floor, on a corner that has stood empty for years. It keeps to the front line of its neighbours and leaves a garden behind.',
    applicant: 'Tobin Harrowgill',
    state: 'approved',
    sentBackReasons: [],
    comments: [],
  },
  'larkwicket-court': {
    title: 'Larkwicket Court',
    description:
      'Rental apartments in the place of two houses. The first design had six storeys; the second has two storeys on the street and three behind. All cars stand at the back.',
    applicant: 'Perrin Calloquist',
    state: 'report-issued',
    sentBackReasons: [
      'Six storeys take too much winter sun from the gardens across Larkwicket Street. Please lower the building, above all on the street, and send the massing again.',
    ],
    comments: [],
  },
  'wickmoor-pair': {
    title: 'Two small houses on Wickmoor Road',
    description:
      'A front house for a family and a smaller one behind it for grandparents. Both share one drive and one garden by the creek.',
    applicant: 'Maud Ellerquist',
    state: 'draft',
    sentBackReasons: [],
    comments: [],
  },
  'hempwright-cottages': {
    title: 'Hempwright Cottages',
    description:
      'Three row houses of two storeys that share their walls. Each has a door to the street and a garden behind.',
    applicant: 'Osric Pellowfen',
    state: 'submitted',
    sentBackReasons: [],
    comments: [],
  },
  'candlegate-foot': {
    title: 'Homes over shops at the foot of Candlegate Street',
    description:
      'Four storeys and 13.8 m with two shops below and nine homes above, in the place of two shops that were damaged by water. The new front keeps the width and the line of the old ones.',
    applicant: 'Ilse Vantwistle',
    state: 'open-for-comment',
    sentBackReasons: [],
    comments: [
      {
        author: 'Hedwin Marchbole',
        address: '6 Candlegate Street',
        text: 'I am glad that the corner will be lived in again. Our back yards have little sun in winter as it is. Please tell me how much of it is left, and let the store at the back stay as low as it is drawn.',
      },
      {
        author: 'Annick Sorrowby',
        address: '1 Lanternyard Street',
        text: 'Our courtyard lies just behind these shops, and the children play there in the afternoon. I ask for one storey less on the side of the court.',
      },
    ],
  },
};
