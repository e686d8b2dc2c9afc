/** What every set-up of a catchment model chooses, with the words by which a stated topic is recognised. */
export const topics: readonly { readonly name: string; readonly words: RegExp }[] = [
  {
    name: 'spatial units',
    words: /spatial|unit|discreti[sz]ation|sub-?(?:catchment|basin)|zones?|grid|mesh|lumped/i,
  },
  { name: 'evapotranspiration', words: /evapo|\bp?et\b/i },
  { name: 'runoff generation', words: /runoff|infiltration|saturation|rainfall.excess/i },
  { name: 'routing', words: /routing|channel|river|hydraulic/i },
];
