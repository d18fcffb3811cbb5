import * as z from 'zod';
import { MOUNT_KINDS, siteSchema } from './rig';
import { SENSORS } from './setup';

const lengthMm = (most: number) => z.number().positive().max(most);
const periodSeconds = z.number().positive().max(90_000);
const subSeconds = z.number().min(1).max(3600);

const opticsFields = {
  focalLengthMm: lengthMm(20_000).optional(),
  apertureMm: lengthMm(10_000).optional(),
  pixelUm: z.number().positive().max(50).optional(),
  binning: z.int().min(1).max(8).optional(),
};

/** RIG.json: what the command line may be told of mount, optics and site. Every key is optional, none else is taken. */
export const rigDescriptionSchema = z
  .strictObject({
    name: z.string().max(80).optional(),
    mount: z
      .strictObject({
        kind: z.enum(MOUNT_KINDS).optional(),
        wormTeeth: z.int().min(10).max(5000).optional().describe('Teeth of the RA wheel'),
        wormPeriodSeconds: periodSeconds.optional().describe('Wins over wormTeeth'),
        gearStages: z
          .array(z.strictObject({ name: z.string().min(1).max(60), periodSeconds }))
          .max(12)
          .optional(),
        guideRateSidereal: z
          .number()
          .positive()
          .max(2)
          .optional()
          .describe('Guide speed as a fraction of the sidereal rate, both axes'),
      })
      .optional(),
    imaging: z.strictObject({ ...opticsFields, sensor: z.enum(SENSORS).optional() }).optional(),
    filters: z
      .array(z.strictObject({ name: z.string().min(1).max(60), subSeconds }))
      .max(20)
      .optional(),
    guiding: z.strictObject(opticsFields).optional(),
    seeingFwhmArcsec: z
      .number()
      .positive()
      .max(15)
      .optional()
      .describe('Long-exposure star size without guide error'),
    subSeconds: subSeconds.optional().describe('Length of one sub for the sub forecast'),
    keepAspect: z.number().min(1).max(3).optional().describe('Largest aspect ratio that is kept'),
    site: z
      .strictObject({
        latitudeDegrees: z.number().min(-90).max(90).optional().describe('North positive'),
        longitudeDegrees: z.number().min(-180).max(180).optional().describe('East positive'),
        timeZone: siteSchema.shape.timeZone.optional(),
      })
      .optional(),
  })
  .meta({ id: 'RigDescription' });
export type RigDescription = z.infer<typeof rigDescriptionSchema>;
