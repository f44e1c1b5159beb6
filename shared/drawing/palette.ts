/** The colours of a drawing. Colour is kept for sun, shade and "not met"; each has a form that says the same in grey. */
export const palette = {
  paper: '#F7F4EC',
  ink: '#20262B',
  /** Lesser text; 8:1 on paper. */
  inkLight: '#474D52',
  hairline: '#A9A69E',
  street: '#ECE6D8',
  building: '#E6E0D2',
  buildingLine: '#6E6C66',
  /** Shadow that is there already: plain fill with a full outline. */
  shadow: '#4A5A7A',
  /** Net new shadow and "not met": diagonal hatch, a cross. */
  madder: '#A3263B',
  sunLine: '#966400',
  sunFill: '#F6D27A',
} as const;
