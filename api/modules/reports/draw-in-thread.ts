import { parentPort, workerData } from 'node:worker_threads';
import { renderReport } from './render-report.ts';
import { reportPayloadSchema } from './report-payload.ts';

/** The thread of `renderReportApart`: draws the payload that it is started with, answers once and ends. */
const { bytes, pages } = await renderReport(reportPayloadSchema.parse(workerData));
parentPort?.postMessage({ bytes, pages });
