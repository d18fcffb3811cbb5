/** Where a finding starts to matter, and why there. The one table of all findings. */
export interface Threshold {
  readonly watch: number;
  readonly act: number;
  readonly because: string;
}

export const THRESHOLDS = {
  /** Share of an axis' variance that one cause brings. */
  share: {
    watch: 0.15,
    act: 0.3,
    because:
      'Curing 15 % of a variance lowers the RMS by 8 %, which nights differ by anyway; 30 % lowers it by 16 %.',
  },
  /** RMS of one cause over the standard deviation of the seeing disc. */
  rmsPerSeeingSigma: {
    watch: 0.32,
    act: 0.46,
    because:
      'Stars lengthen to sqrt(1 + r²): 1.05 at 0.32, which is a measurable change, and 1.10 at 0.46, which eyes see.',
  },
  /** RMS of one cause in imaging pixels. */
  rmsImagingPx: {
    watch: 0.2,
    act: 0.33,
    because:
      'Below a fifth of a pixel no star profile shows it; a third is common practice as a limit.',
  },
  /** RMS of one cause in arcsec where neither seeing nor imaging scale are known. */
  rmsArcsec: {
    watch: 0.3,
    act: 0.45,
    because:
      'The two rows above for a star of 2.3 arcsec, a common one; common practice, no source.',
  },
  /** Share of the variance that the seeing floor takes: mount findings are held below 'act'. */
  floorShare: {
    watch: 0.5,
    act: 0.6,
    because:
      'With half of an axis or 60 % of both from the sky, no cure changes the stars by more than the sky does.',
  },
  /** Loss of RMS at the gain of the night against the best one, by replay. */
  gainLoss: {
    watch: 0.1,
    act: 0.25,
    because: 'A tenth of the RMS is more than the replay itself is uncertain by.',
  },
  /** Difference between the directions over their mean. */
  asymmetry: {
    watch: 0.2,
    act: Infinity,
    because:
      'A loop bears 20 % easily; beyond that one side is followed later than the other. A sign, never a proof.',
  },
  /** Response over what the guide rate makes it, off 1. */
  responseOff: {
    watch: 0.2,
    act: 0.5,
    because: 'It moves the gain by as much: 20 % is felt, 50 % makes a loop limp or swing.',
  },
  /** Polar error in arcmin where subs and imaging scale are not known. */
  polarArcmin: {
    watch: 4,
    act: 10,
    because:
      'A Dec drift of 1 and 2.6 arcsec a minute: subs of minutes and Dec guiding one way bear the first.',
  },
  /** Blur by field rotation in a sub, a degree from the guide star, in imaging pixels. */
  fieldRotationPx: {
    watch: 1,
    act: 2,
    because: 'A pixel of rotation shows in the corners first; a degree covers common sensors.',
  },
  /** Dec gap in star sizes (seeing FWHM). */
  backlashPerStar: {
    watch: 1,
    act: Infinity,
    because:
      'A gap as wide as a star lets Dec stand still for many corrections after each reversal; harm is in its share.',
  },
  /** Drive slope in tolerances a guide frame. */
  steepSlope: {
    watch: 1,
    act: Infinity,
    because:
      'A slope that moves the star beyond the tolerance between two corrections outruns any gain.',
  },
  /** Periodic error over what is usual on this rig. */
  growth: {
    watch: 1.3,
    act: Infinity,
    because: 'The fit is good to 5 %; 30 % more than usual is wear or dirt, not chance.',
  },
  /** Part of the frames without a star. */
  starLost: {
    watch: 0.03,
    act: 0.15,
    because: 'Three in a hundred cost a sub or two a night; one in seven costs most of them.',
  },
  /** Pearson correlation of the axes. */
  correlation: {
    watch: 0.3,
    act: Infinity,
    because:
      'Independent axes stay within a few hundredths; 0.3 is a tenth of the variance in common.',
  },
  /** Imaging pixels a star (seeing FWHM): fewer than the first or more than the second. */
  samplingPx: {
    watch: 1,
    act: Infinity,
    because: 'Below one pixel a star no shape is recorded; two to three are common practice.',
  },
  oversamplingPx: {
    watch: 6,
    act: Infinity,
    because:
      'Beyond six pixels a star the camera magnifies the seeing; common practice, no source.',
  },
  /** Response to small corrections over that to large ones. */
  stiction: {
    watch: 0.6,
    act: 0.3,
    because: 'Free gears answer all corrections alike; below 0.6 small ones are held by friction.',
  },
} as const satisfies Record<string, Threshold>;

/** Runs shorter than this tell no mount: ten minutes hold two dozen independent stretches of guiding. */
export const SHORTEST_RUN_SECONDS = 600;
/** Standard errors that a measure must differ by before it is a finding. */
export const CLEAR_SIGMAS = 3;
