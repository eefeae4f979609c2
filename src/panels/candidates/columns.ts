/** Columns of the candidate table that can be shown or hidden, by their name in the session. */
export const choosable: Readonly<Record<string, { readonly heading: string; readonly says: string }>> = {
  lnL: { heading: 'ln L', says: 'natural logarithm of the exact likelihood, all constants kept' },
  sigma: { heading: 'σ', says: 'standard deviation of the innovations' },
  k: { heading: 'k', says: 'parameters counted in the criteria, σ² among them' },
  aic: { heading: 'AIC', says: 'Akaike’s criterion' },
  aicc: { heading: 'AICc', says: 'Akaike’s criterion corrected for few readings' },
  bic: { heading: 'BIC', says: 'Schwarz’s criterion' },
  hq: { heading: 'HQ', says: 'Hannan and Quinn’s criterion' },
  delta: { heading: 'Δ', says: 'AICc above the best row it may be compared with' },
  whiteness: { heading: 'white p', says: 'joint p-value for memory left in the innovations; small: memory is left' },
};
