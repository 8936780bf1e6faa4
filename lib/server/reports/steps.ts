/** Steps that the progress of a report counts: sheet worked out, map drawn, pages made, file stored. */
export const REPORT_STEPS = 4;
