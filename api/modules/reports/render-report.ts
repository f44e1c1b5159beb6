import { fileURLToPath } from 'node:url';
import { default as pdfmake } from 'pdfmake';
import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces';
import { palette } from '../../../shared/drawing/palette.ts';
import { commentsPart } from './report-parts/comments.ts';
import { keyDateSheets } from './report-parts/key-date-sheets.ts';
import { ledgerPart } from './report-parts/ledgers.ts';
import { methodAndLimits } from './report-parts/method-and-limits.ts';
import { makePrintable } from './report-parts/printable-text.ts';
import {
  fontFamily,
  page,
  pageWidths,
  styles,
  type ReportPageSize,
} from './report-parts/report-look.ts';
import { createReportScene, type ReportScene } from './report-parts/report-scene.ts';
import { requestAndRecommendation } from './report-parts/request-and-recommendation.ts';
import { ruleAndFindings } from './report-parts/rule-and-findings.ts';
import { siteAndProposal } from './report-parts/site-and-proposal.ts';
import { summaryPage } from './report-parts/summary.ts';
import type { ReportPayload } from './report-payload.ts';

export interface RenderedReport {
  bytes: Buffer;
  pages: number;
}

const fontFile = (weight: string) =>
  fileURLToPath(import.meta.resolve(`@expo-google-fonts/public-sans/${weight}.ttf`));
const regular = fontFile('400Regular/PublicSans_400Regular');
const semiBold = fontFile('600SemiBold/PublicSans_600SemiBold');

pdfmake.setFonts({
  [fontFamily]: { normal: regular, bold: semiBold, italics: regular, bolditalics: semiBold },
});
// A report is drawn from its payload alone: nothing is fetched, and no file but the fonts is read.
pdfmake.setUrlAccessPolicy(() => false);
pdfmake.setLocalAccessPolicy((path) => path === regular || path === semiBold);

/**
 * Draws a staff report as a PDF. The same payload gives the same bytes.
 *
 * @throws when the payload's rows and the study's findings disagree
 */
export async function renderReport(
  payload: ReportPayload,
  { pageSize = 'LETTER' }: { pageSize?: ReportPageSize } = {},
): Promise<RenderedReport> {
  const printable = makePrintable(payload);
  const scene = createReportScene(printable.payload);
  let pages = 0;
  const definition: TDocumentDefinitions = {
    ...documentFacts(scene),
    pageSize,
    pageMargins: [sideMargin(pageSize), page.top, sideMargin(pageSize), page.bottom],
    defaultStyle: { font: fontFamily, fontSize: 9.5, lineHeight: 1.3, color: palette.ink },
    styles,
    content: [
      ...summaryPage(scene),
      ...requestAndRecommendation(scene),
      ...siteAndProposal(scene),
      ...ruleAndFindings(scene),
      ...keyDateSheets(scene),
      ...ledgerPart(scene),
      ...commentsPart(scene),
      ...methodAndLimits(scene, printable.hasMissingCharacters),
    ],
    header: (currentPage) => (currentPage === 1 ? '' : runningHead(scene, pageSize)),
    footer: (currentPage, pageCount) => {
      pages = pageCount;
      return runningFoot(currentPage, pageCount, pageSize);
    },
    // A heading stays with at least some of what it heads.
    pageBreakBefore: (node, { getFollowingNodesOnPage }) =>
      node.headlineLevel !== undefined && getFollowingNodesOnPage().length === 0,
  };
  const bytes = await pdfmake.createPdf(definition).getBuffer();
  return { bytes, pages };
}

function documentFacts({ payload }: ReportScene): Partial<TDocumentDefinitions> {
  const { municipality, reviewCase, number, issuedByName, issuedAt } = payload;
  return {
    version: '1.7',
    language: municipality.locale,
    displayTitle: true,
    info: {
      title: `Staff report ${number}: ${reviewCase.title}`,
      author: `${issuedByName}, ${municipality.name}`,
      subject: `Sun and shadow of case ${reviewCase.number}, massing revision ${payload.revision.revision}`,
      creator: 'Noonmark',
      producer: 'Noonmark',
      creationDate: new Date(issuedAt),
      modDate: new Date(issuedAt),
    },
  };
}

function sideMargin(pageSize: ReportPageSize): number {
  return (pageWidths[pageSize] - page.textWidth) / 2;
}

function runningHead({ payload }: ReportScene, pageSize: ReportPageSize): Content {
  const { reviewCase, revision, number } = payload;
  return {
    columns: [
      `${reviewCase.number} ${reviewCase.title} · revision ${revision.revision}`,
      { text: `Report ${number}`, alignment: 'right', width: 110 },
    ],
    fontSize: 7.5,
    color: palette.inkLight,
    margin: [sideMargin(pageSize), 27, sideMargin(pageSize), 0],
  };
}

function runningFoot(currentPage: number, pageCount: number, pageSize: ReportPageSize): Content {
  return {
    columns: [
      'Planning-level study on the massing as submitted; no survey and no legal opinion. The local code and licensed professionals decide.',
      { text: `p. ${currentPage} of ${pageCount}`, alignment: 'right', width: 60 },
    ],
    fontSize: 7,
    color: palette.inkLight,
    margin: [sideMargin(pageSize), 17, sideMargin(pageSize), 0],
  };
}
