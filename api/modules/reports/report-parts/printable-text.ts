import type { ReportPayload } from '../report-payload.ts';

/** Stands for a character that the report's font lacks. */
export const missingCharacter = '◊';

/** Longer words would run over the edge of the page. */
const longestWord = 50;

/** Characters that have a plain twin in the font. */
const twins: Partial<Record<string, string>> = {
  '\u2009': ' ',
  '\u202F': '\u00A0',
  '\u00AD': '',
  '\u200B': '',
  '\u2011': '-',
  '\u2010': '-',
  '\u2012': '–',
  '\u2032': "'",
  '\u2033': '"',
  '\u2190': '<-',
  '\u2192': '->',
  '\t': ' ',
  '\r': '',
};

/** What Public Sans draws, as read from its character map: Latin with its accents, figures, punctuation, Vietnamese. */
const printable =
  /^[\n\u0020-\u007E\u00A0-\u0131\u0134-\u0148\u014A-\u017E\u018F\u0192\u01A0\u01A1\u01AF\u01B0\u01FA-\u021B\u02BB\u02BC\u02C6\u02C7\u1E80-\u1E85\u1EA0-\u1EF9\u2013\u2014\u2018-\u201A\u201C-\u201E\u2020-\u2022\u2026\u2030\u2039\u203A\u2044\u20AB\u20AC\u2116\u2122\u2126\u2212\u2248\u2260\u2264\u2265\u25CA]$/u;

/**
 * The payload with every text made printable: combined accents, plain twins for a few signs, a
 * lozenge for what the font cannot draw, and breaks in words that no line can hold.
 *
 * @returns also whether any character had to be replaced by the lozenge
 */
export function makePrintable(payload: ReportPayload): {
  payload: ReportPayload;
  hasMissingCharacters: boolean;
} {
  let hasMissingCharacters = false;
  const print = (text: string) => {
    const printed = toPrintable(text);
    if (printed.includes(missingCharacter) && !text.includes(missingCharacter)) {
      hasMissingCharacters = true;
    }
    return printed;
  };
  const printWords = (text: string) => breakLongWords(print(text));
  const { reviewCase, municipality, revision, study, surroundings } = payload;
  return {
    payload: {
      ...payload,
      issuedByName: printWords(payload.issuedByName),
      municipality: { ...municipality, name: printWords(municipality.name) },
      reviewCase: {
        number: reviewCase.number,
        title: printWords(reviewCase.title),
        address: printWords(reviewCase.address),
        description: printWords(reviewCase.description),
        applicantName: printWords(reviewCase.applicantName),
      },
      siteParcels: payload.siteParcels.map((parcel) => ({
        ...parcel,
        number: printWords(parcel.number),
        address: printWords(parcel.address),
        zone: printWords(parcel.zone),
        use: printWords(parcel.use),
      })),
      revision: {
        ...revision,
        fileName: printWords(revision.fileName),
        blocks: revision.blocks.map((block) => ({
          ...block,
          properties: {
            ...block.properties,
            id: printWords(block.properties.id),
            name: block.properties.name === null ? null : printWords(block.properties.name),
          },
        })),
      },
      surroundings: {
        ...surroundings,
        buildings: surroundings.buildings.map((one) => ({
          ...one,
          heightSource: printWords(one.heightSource),
        })),
        streets: surroundings.streets.map((one) => ({ ...one, name: print(one.name) })),
        streetLines: surroundings.streetLines.map((one) => ({ ...one, name: print(one.name) })),
        water: surroundings.water.map((one) => ({ ...one, name: print(one.name) })),
        openSpace: surroundings.openSpace.map((one) => ({ ...one, name: print(one.name) })),
      },
      study: {
        ...study,
        rule: {
          ...study.rule,
          title: printWords(study.rule.title),
          citation: printWords(study.rule.citation),
          clauses: study.rule.clauses.map((clause) => ({
            ...clause,
            title: printWords(clause.title),
          })),
        },
      },
      findingRows: payload.findingRows.map((row) => ({
        ...row,
        label: printWords(row.label),
        clauseTitle: printWords(row.clauseTitle),
        band: row.band === null ? null : printWords(row.band),
        sentence: printWords(row.sentence),
      })),
      receptors: payload.receptors.map((one) => ({ ...one, label: printWords(one.label) })),
      ledgers: payload.ledgers.map((one) => ({ ...one, label: printWords(one.label) })),
      publishedComments: payload.publishedComments.map((comment) => ({
        ...comment,
        authorName: printWords(comment.authorName),
        body: printWords(comment.body),
      })),
      narrative: printWords(payload.narrative),
      recommendation: printWords(payload.recommendation),
    },
    hasMissingCharacters,
  };
}

function toPrintable(text: string): string {
  return Array.from(text.normalize('NFC'), (character) => {
    const twin = twins[character];
    if (twin !== undefined) return twin;
    return printable.test(character) ? character : missingCharacter;
  }).join('');
}

function breakLongWords(text: string): string {
  return text.replace(new RegExp(`(\\S{${longestWord}})(?=\\S)`, 'g'), '$1 ');
}
