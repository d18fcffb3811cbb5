/** RIG.json: what the analysis may know of mount, optics and site. Every key is optional; units stand in the names. */
export interface RigDescription {
  readonly name?: string | undefined;
  readonly mount?:
    | {
        readonly kind?: 'worm' | 'strain wave' | 'friction' | 'direct drive' | 'other' | undefined;
        /** Teeth of the RA wheel: worm period = sidereal day / teeth. */
        readonly wormTeeth?: number | undefined;
        /** Wins over `wormTeeth`. */
        readonly wormPeriodSeconds?: number | undefined;
        readonly gearStages?: readonly GearStage[] | undefined;
        /** Guide speed as a fraction of the sidereal rate, both axes. */
        readonly guideRateSidereal?: number | undefined;
      }
    | undefined;
  readonly imaging?: ImagingOptics | undefined;
  readonly filters?: readonly { readonly name: string; readonly subSeconds: number }[] | undefined;
  readonly guiding?: GuideOptics | undefined;
  /** Long-exposure star size without guide error. */
  readonly seeingFwhmArcsec?: number | undefined;
  /** Length of one sub for the sub forecast. */
  readonly subSeconds?: number | undefined;
  /** Largest aspect ratio that the owner keeps. */
  readonly keepAspect?: number | undefined;
  readonly site?:
    | {
        readonly latitudeDegrees?: number | undefined;
        readonly longitudeDegrees?: number | undefined;
        readonly timeZone?: string | undefined;
      }
    | undefined;
}

export interface GearStage {
  readonly name: string;
  readonly periodSeconds: number;
}

export interface GuideOptics {
  readonly focalLengthMm?: number | undefined;
  readonly apertureMm?: number | undefined;
  readonly pixelUm?: number | undefined;
  readonly binning?: number | undefined;
}

export interface ImagingOptics extends GuideOptics {
  readonly sensor?: 'mono' | 'one-shot colour' | undefined;
}
