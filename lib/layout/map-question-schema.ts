import { z } from 'zod';
import { toolSchema } from './items';
import { mapSettingsSchema } from './map-settings';

/**
 * One map as it is asked for and stored. It is asked for in the robot's own base frame, so it stays the same wherever the
 * base stands: x out of the base, heights above the base plate.
 */
export const mapQuestionSchema = z.object({
  armId: z.uuid(),
  tool: toolSchema.pick({ xMm: true, yMm: true, zMm: true, rollDeg: true, pitchDeg: true, yawDeg: true }),
  /** Height of the tool point above the base plate: tool height on the sheet less the riser. */
  toolHeightMm: z.number().min(-20_000).max(20_000),
  /** A fixed roll counts in the base frame. */
  settings: mapSettingsSchema.pick({
    tiltDeg: true,
    towards: true,
    coneDeg: true,
    rollDeg: true,
    wrist: true,
    branch: true,
    stepMm: true,
  }),
  /** Heading in the base frame; only used with `towards: heading` and a tilt. */
  headingDeg: z.number().min(-720).max(720).default(0),
});
export type MapQuestion = z.infer<typeof mapQuestionSchema>;
