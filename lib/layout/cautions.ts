/** What the product itself must say beside its figures, in reports and on screen. */

export const GENERAL_CAUTION =
  'Every figure here is a planning aid, computed from the data typed in. A wrong length, limit or speed gives a wrong figure.';

export const SAFETY_CAUTION =
  'Stopping distances, guarding and protective devices need a risk assessment, measured stopping times, local codes, and licensed or ' +
  'competent persons. No figure here replaces any of them.';

export const SOURCE_CAUTION =
  'A figure that follows from a standard names its edition and source and can be edited. Tables under copyright are not part of the ' +
  'product: their values were typed in by the user from their own copy.';

export const REACH_CAUTION =
  'Reach and speed are worked out for rigid arms in still posture. Cables, dress packs, payload, dynamics and the control of the robot ' +
  'can make less of them; check them on the machine.';

export const CAUTIONS = [GENERAL_CAUTION, SAFETY_CAUTION, REACH_CAUTION, SOURCE_CAUTION] as const;
