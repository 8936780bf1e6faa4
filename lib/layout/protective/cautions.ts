/** What stands beside every figure of distances, on the sheet and in reports. */
export const CAUTIONS: readonly string[] = [
  'Planning aids from the data typed in.',
  'Stopping distances, guarding and protective devices need a risk assessment, measured stopping times, local codes and licensed or competent persons.',
  'Figures of standards come from secondary sources and memory. Check edition and value against your own copy; each can be changed.',
];
