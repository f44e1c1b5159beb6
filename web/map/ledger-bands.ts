/** The sunlit share (0..1) of a receptor's open area at one instant, before and after. */
export interface BandSample {
  atMs: number;
  shareBefore: number;
  shareAfter: number;
}

export interface BandPaths {
  /** Sun before, in the upper band. */
  before: string;
  /** Sun that stays, in the lower band. */
  after: string;
  /** Sun that is lost, in the lower band on top of what stays; empty where nothing is lost. */
  lost: string;
}

interface BandBox {
  xOf: (atMs: number) => number;
  /** The lower edges of the two bands and the height that the whole open area in sun fills. */
  beforeBottom: number;
  afterBottom: number;
  height: number;
}

/**
 * The two bands of a day as SVG path data: as high as the share of the open area in sun,
 * linear between samples (as the rule's durations integrate).
 */
export function bandPaths(samples: readonly BandSample[], box: BandBox): BandPaths {
  const { xOf, beforeBottom, afterBottom, height } = box;
  const zero = () => 0;
  const kept = (one: BandSample) => one.shareAfter;
  const had = (one: BandSample) => Math.max(one.shareBefore, one.shareAfter);
  const area = (
    bottom: number,
    lower: (one: BandSample) => number,
    upper: (one: BandSample) => number,
  ) => {
    if (!samples.some((one) => upper(one) - lower(one) > 1e-6)) return '';
    const point = (one: BandSample, share: number) =>
      `${xOf(one.atMs).toFixed(2)} ${(bottom - share * height).toFixed(2)}`;
    const along = samples.map((one) => point(one, upper(one)));
    const back = samples.toReversed().map((one) => point(one, lower(one)));
    return `M${along.join('L')}L${back.join('L')}Z`;
  };
  return {
    before: area(beforeBottom, zero, (one) => one.shareBefore),
    after: area(afterBottom, zero, kept),
    lost: area(afterBottom, kept, had),
  };
}
