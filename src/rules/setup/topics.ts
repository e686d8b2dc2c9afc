interface Topic {
  readonly name: string;
  /** By which a stated topic is recognised. */
  readonly words: RegExp;
}

export const spatialUnits: Topic = {
  name: 'spatial units',
  // Not the unit hydrograph.
  words:
    /spatial|\bunits\b|response unit|discreti[sz]ation|sub-?(?:catchment|basin)|zones?|grid|mesh|lumped/i,
};

/** What every set-up of a catchment model chooses. */
export const topics: readonly Topic[] = [
  spatialUnits,
  { name: 'evapotranspiration', words: /evapo|\bp?et\b/i },
  { name: 'runoff generation', words: /runoff|infiltration|saturation|rainfall.excess/i },
  { name: 'routing', words: /routing|channel|river|hydraulic/i },
];
