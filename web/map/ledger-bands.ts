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
    const point = (one: BandSample, share: number) =>
      `${xOf(one.atMs).toFixed(2)} ${(bottom - share * height).toFixed(2)}`;
    return runsWith(samples, (one) => upper(one) - lower(one) > leastShare)
      .map((run) => {
        const along = run.map((one) => point(one, upper(one)));
        const back = run.toReversed().map((one) => point(one, lower(one)));
        return `M${along.join('L')}L${back.join('L')}Z`;
      })
      .join('');
  };
  return {
    before: area(beforeBottom, zero, (one) => one.shareBefore),
    after: area(afterBottom, zero, kept),
    lost: area(afterBottom, kept, had),
  };
}

/** A smaller share is rounding. */
const leastShare = 1e-6;

/**
 * The stretches in which something is there, each with the samples between which it begins and ends;
 * where nothing is, no outline may seem to say otherwise.
 */
function runsWith(
  samples: readonly BandSample[],
  isThere: (one: BandSample) => boolean,
): BandSample[][] {
  const runs: BandSample[][] = [];
  samples.slice(1).forEach((to, index) => {
    const from = samples[index];
    if (from === undefined || !(isThere(from) || isThere(to))) return;
    const last = runs.at(-1);
    if (last?.at(-1) === from) last.push(to);
    else runs.push([from, to]);
  });
  return runs;
}
