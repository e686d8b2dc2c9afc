/** What a pass is not. Said wherever a pass is said. */
export const caution =
  'A pass means that the records are complete and agree with the files. It does not make a model fit for ' +
  'flood protection, dam safety, drinking water or licensing: local regulations and licensed practice decide.';
