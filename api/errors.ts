import { errorStatuses } from '../shared/contracts/problem.ts';
import type { ErrorCode, Problem } from '../shared/contracts/problem.ts';

/** What a person reads when the place that raises the error has no better sentence. */
const defaultTitles = {
  INPUT_INVALID: 'Some of what was sent cannot be taken. Correct the marked fields and send again.',
  NOT_SIGNED_IN: 'Sign in first.',
  SIGN_IN_FAILED: 'The e-mail address or the password is not right.',
  FORBIDDEN: 'Your account may not do this.',
  ORIGIN_FOREIGN:
    'This request came from another site and was refused. Open this site and try again.',
  NOT_FOUND: 'There is nothing here. Check the address.',
  CASE_TRANSITION_REFUSED: 'The case cannot take this step from its present state.',
  CASE_CHANGED_MEANWHILE:
    'The case has changed meanwhile. Load it again and look before you go on.',
  MASSING_UNREADABLE: 'The massing file could not be read.',
  MASSING_UNSOUND: 'The massing has errors. Correct them and upload it again.',
  MASSING_MISSING: 'Upload a massing first.',
  MUNICIPALITY_SET_UP: 'The municipality is set up already.',
  RULE_MISSING: 'No rule is in force today. Put one in force first.',
  RULE_IS_KEPT:
    'This version of the rule is or was in force and stays as it is. Make a new version from it.',
  RULE_CHANGED_MEANWHILE:
    'Somebody has changed this draft meanwhile. Load it again and look before you go on.',
  STUDY_RUNNING: 'A study of this revision is already under way.',
  STUDY_MISSING: 'Run a study first.',
  STUDY_NOT_FINISHED: 'The study is not finished yet.',
  INSTANT_INVALID: 'The sun is down at this instant. Choose a time between sunrise and sunset.',
  UPLOAD_TOO_LARGE: 'The file is too large.',
  RATE_LIMITED: 'Too many requests. Wait a little and try again.',
  IDEMPOTENCY_KEY_REUSED: 'This Idempotency-Key was used for another request. Send a new one.',
  UNAVAILABLE: 'The service is not ready. Try again in a moment.',
  INTERNAL: 'Something went wrong on our side. Try again; if it stays, report the request id.',
} as const satisfies Record<ErrorCode, string>;

interface AppErrorOptions {
  /** A sentence that a person can act on. */
  title?: string;
  detail?: string;
  errors?: Problem['errors'];
}

/** An expected error: it reaches the person as problem details (RFC 9457). */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly problem: Problem;

  constructor(code: ErrorCode, options: AppErrorOptions = {}) {
    const title = options.title ?? defaultTitles[code];
    super(title);
    this.name = 'AppError';
    this.code = code;
    this.problem = {
      type: 'about:blank',
      title,
      status: errorStatuses[code],
      code,
      ...(options.detail === undefined ? {} : { detail: options.detail }),
      ...(options.errors === undefined ? {} : { errors: options.errors }),
    };
  }
}
