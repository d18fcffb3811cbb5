import * as z from 'zod';

export const MOUNT_KINDS = ['worm', 'strain wave', 'friction', 'direct drive', 'other'] as const;
export const RIG_ROLES = ['owner', 'operator', 'advisor'] as const;

const periodSecondsSchema = z.number().positive().max(90_000);

export const mountSchema = z.strictObject({
  kind: z.enum(MOUNT_KINDS),
  wormTeeth: z.int().min(10).max(5000).nullable().describe('Teeth of the RA wheel'),
  wormPeriodSeconds: periodSecondsSchema.nullable().describe('Wins over wormTeeth'),
  gearStages: z
    .array(
      z.strictObject({
        name: z.string().trim().min(1).max(60),
        periodSeconds: periodSecondsSchema,
      }),
    )
    .max(12),
  guideRateSidereal: z
    .number()
    .positive()
    .max(2)
    .nullable()
    .describe('Guide speed as a fraction of the sidereal rate, both axes'),
});
export type Mount = z.infer<typeof mountSchema>;

export const siteSchema = z.strictObject({
  latitudeDegrees: z.number().min(-90).max(90).nullable().describe('North positive'),
  longitudeDegrees: z.number().min(-180).max(180).nullable().describe('East positive'),
  timeZone: z
    .string()
    .refine(isTimeZone, 'needs a time zone such as Europe/Lisbon')
    .describe('IANA name'),
});
export type Site = z.infer<typeof siteSchema>;

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false; // a RangeError: there is no other way to ask
  }
}

const rigFields = {
  name: z.string().trim().min(1, 'needs a name').max(80),
  mount: mountSchema,
  site: siteSchema,
};

export const createRigSchema = z.strictObject(rigFields);
export type CreateRig = z.infer<typeof createRigSchema>;
/** PUT with If-Match: two people may edit one rig. */
export const updateRigSchema = createRigSchema;

export const rigSchema = z
  .strictObject({
    ...rigFields,
    id: z.uuid(),
    role: z.enum(RIG_ROLES).describe('Of the account that asks'),
    version: z.int().describe('Raised by each change; the ETag'),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'Rig' });
export type Rig = z.infer<typeof rigSchema>;

export const rigPaths = {
  all: '/api/v1/rigs',
  one: (rigId: string) => `/api/v1/rigs/${rigId}`,
} as const;
